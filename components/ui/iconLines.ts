/** Lines on a 24 × 24 sheet, drawn with square corners. */
export const LINES = {
  home: 'M3.5 11.5 12 4l8.5 7.5M5.5 10v10h13V10M10 20v-5.5h4V20',
  map: 'M3.5 6.5 9 4l6 2.5L20.5 4v13.5L15 20l-6-2.5L3.5 20zM9 4v13.5M15 6.5V20',
  bag: 'M5 8.5h14l1 11.5H4zM8.5 11V7a3.5 3.5 0 0 1 7 0v4',
  person: 'M12 11.5a4 4 0 1 0 0-8 4 4 0 0 0 0 8zM4 20.5c0-4 3-6 8-6s8 2 8 6',
  district: 'M4 4h6v6H4zM14 4h6v4h-6zM14 12h6v8h-6zM4 14h6v6H4z',
  rounds: 'M4 20V9l5-5h11v11l-5 5zM4 9h11v11M15 9l5-5',
  outlines: 'M5 4.5 14 3l6 6-2 10-11 2-3-8zM5 4.5l0 0M14 3l0 0',
  review: 'M5 3.5h14v17H5zM8.5 12l2.5 2.5L15.5 9',
  stock:
    'M3.5 19.5h17M3.5 14.5h17M3.5 9.5h17M3.5 4.5h17M3.5 4.5v15M20.5 4.5v15M9 4.5v5M15 4.5v5M12 9.5v5M7 14.5v5M16 14.5v5',
  'years-ahead': 'M3.5 20.5h17M5 17h3v3.5M8 20.5V13h3v7.5M11 13V8h3v12.5M14 8V4h3v16.5',
  runs: 'M12 3.5a8.5 8.5 0 1 0 8.5 8.5M12 7v5l3.5 2M15 3.5h5.5V9',
  'factor-book':
    'M4 4.5h6.5L12 6l1.5-1.5H20v14h-6.5L12 20l-1.5-1.5H4zM12 6v14M7 9h2.5M7 12.5h2.5M14.5 9H17M14.5 12.5H17',
  calibrate: 'M4 20 20 4M4 20v-5.5L14.5 4H20v5.5L9.5 20zM8 12l2 2M11 9l2 2',
  loads:
    'M2.5 6.5h11v10h-11zM13.5 10H18l3.5 3.5v3h-8M6.5 19a2 2 0 1 0 0-4 2 2 0 0 0 0 4zM17 19a2 2 0 1 0 0-4 2 2 0 0 0 0 4z',
  listed: 'M5 20.5v-17h14v17M3 20.5h18M8.5 7.5h2M13.5 7.5h2M8.5 11.5h2M13.5 11.5h2M10 20.5V16h4v4.5',
  notices: 'M3.5 5.5h17v13h-17zM3.5 6l8.5 7 8.5-7',
  people:
    'M9 11a3.5 3.5 0 1 0 0-7 3.5 3.5 0 0 0 0 7zM2.5 20c0-4 2.5-6 6.5-6s6.5 2 6.5 6M16 4.5a3.5 3.5 0 0 1 0 6M18 14.5c2.3 1 3.5 2.8 3.5 5.5',
  devices: 'M3.5 4.5h13v9M3.5 4.5v11H11M2.5 19H11M13.5 13.5h7v8h-7zM16.5 19h1',
  access: 'M8 14.5a5 5 0 1 1 4.5-5L21 18v3h-3.5v-2.5H15V16h-2.5l-1.5-1.5',
  audit: 'M5 3.5h14v17H5zM8.5 8h7M8.5 12h7M8.5 16h4',
  camera: 'M3.5 7.5h4L9.5 5h5l2 2.5h4v12h-17zM12 16.5a3.5 3.5 0 1 0 0-7 3.5 3.5 0 0 0 0 7z',
  locate: 'M12 18.5a6.5 6.5 0 1 0 0-13 6.5 6.5 0 0 0 0 13zM12 2v5M12 17v5M2 12h5M17 12h5',
  back: 'M20 12H5M11 5.5 4.5 12l6.5 6.5',
  forward: 'M4 12h15M13 5.5l6.5 6.5-6.5 6.5',
  close: 'M5.5 5.5l13 13M18.5 5.5l-13 13',
  check: 'M4.5 12.5 10 18 20 6.5',
  search: 'M10.5 17a6.5 6.5 0 1 0 0-13 6.5 6.5 0 0 0 0 13zM15.5 15.5l5.5 5.5',
  plus: 'M12 4.5v15M4.5 12h15',
  minus: 'M4.5 12h15',
  undo: 'M8.5 4.5 4 9l4.5 4.5M4 9h10.5a5.25 5.25 0 0 1 0 10.5H8',
  fit: 'M4 9V4h5M15 4h5v5M20 15v5h-5M9 20H4v-5',
  draw: 'M5 19 4 6.5 14 4l6 8-6.5 8zM3 6.5h2M14 3v2M19 12h2M13.5 19v2',
  down: 'M5.5 9l6.5 6.5L18.5 9',
  up: 'M5.5 15l6.5-6.5L18.5 15',
  download: 'M12 4v11M7 10.5l5 5 5-5M4.5 20h15',
  upload: 'M12 16V5M7 9.5l5-5 5 5M4.5 20h15',
  warning: 'M12 4 2.5 20.5h19zM12 10v5M12 17.2v1.3',
  settings: 'M4 7h9M17 7h3M15 4.5v5M4 12h3M11 12h9M9 9.5v5M4 17h9M17 17h3M15 14.5v5',
  list: 'M8.5 6h12M8.5 12h12M8.5 18h12M3.5 6h1.5M3.5 12h1.5M3.5 18h1.5',
  out: 'M14 4.5H5v15h9M10 12h10.5M16.5 8l4 4-4 4',
} as const

export type IconName = keyof typeof LINES
