/** Invented names of Saltmarsh Hythe. Any likeness to a real street, person or firm is chance. */
export const DISTRICTS = [
  {
    name: 'Ropewalk',
    streets: [
      'Hemp Street',
      'Tar Lane',
      'Sailmaker Yard',
      'Bollard Street',
      'Cordage Row',
      'Old Slip',
      'Gull Passage',
      'Lantern Street',
      'Oakum Lane',
      'Capstan Street',
      'Marl Steps',
      'Tidewell Street',
      'Net Loft Lane',
      'Ferry Street',
    ],
  },
  {
    name: 'Kiln Quarter',
    streets: [
      'Kiln Road',
      'Clinker Street',
      'Pugmill Lane',
      'Claypit Road',
      'Stack Street',
      'Drying Shed Row',
      'Furnace Road',
      'Barrow Way',
      'Slip House Lane',
      'Tile Works Road',
      'Loam Street',
      'Bellows Street',
    ],
  },
  {
    name: 'Upper Fold',
    streets: [
      'Fold Lane',
      'Wether Close',
      'Shearing Road',
      'Thistle Bank',
      'High Pasture',
      'Drovers Way',
      'Fleece Gardens',
      'Larkrise',
      'Stile Road',
      'Hay Barn Close',
      'Upland Avenue',
      'Barley Mount',
      'Rook Hill',
    ],
  },
] as const

export type DistrictName = (typeof DISTRICTS)[number]['name']

export const DEMO_ORGANISATION = 'Saltmarsh Hythe (invented)'

/** One account a role; the password is for the demo on one's own machine only. */
export const DEMO_PASSWORD = 'hythe-tally-demo'
export const DEMO_PEOPLE = [
  { key: 'surveyor', name: 'Wren Attwater', email: 'surveyor@hythe.example', roles: ['surveyor'], firm: null },
  { key: 'planner', name: 'Moss Quillfeather', email: 'planner@hythe.example', roles: ['planner'], firm: null },
  {
    key: 'contractor',
    name: 'Ferrand Okes',
    email: 'contractor@hythe.example',
    roles: ['contractor'],
    firm: 'Okes & Daughter Demolition',
  },
  { key: 'steward', name: 'Isolde Varnish', email: 'steward@hythe.example', roles: ['steward'], firm: null },
  { key: 'surveyor-2', name: 'Tobin Larkwell', email: 'surveyor2@hythe.example', roles: ['surveyor'], firm: null },
  { key: 'surveyor-3', name: 'Juno Saltby', email: 'surveyor3@hythe.example', roles: ['surveyor'], firm: null },
  { key: 'surveyor-4', name: 'Ivo Pennyroyal', email: 'surveyor4@hythe.example', roles: ['surveyor'], firm: null },
  {
    key: 'contractor-2',
    name: 'Bree Causeway',
    email: 'contractor2@hythe.example',
    roles: ['contractor'],
    firm: 'Causeway Plant and Crushing',
  },
] as const
