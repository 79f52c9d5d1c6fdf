/** What a surveyor saw, as a multiplier of the hazard [–]. Common practice, editable; re-centre or calibrate before use. */
export const HAZARD_MULTIPLIER_DEFAULTS = {
  condition: { good: 0.7, fair: 1, poor: 1.6, ruinous: 3 },
  vacancy: { occupied: 1, partlyVacant: 1.3, longTermVacant: 1.8 },
  pressure: { none: 1, redevelopmentZone: 1.5 },
  protection: { none: 1, protected: 0.25 },
} as const
