/** Event of the window: whoever holds something unwritten writes it now, before the database is let go. */
export const KEEP_NOW = 'tallystone-keep-now'
