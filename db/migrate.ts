import type { Driver } from './driver.types'

/** Each entry brings the database one version further; entries are added, never changed. */
const VERSIONS: readonly (readonly string[])[] = [
  [
    'CREATE TABLE meta (name TEXT PRIMARY KEY, value TEXT NOT NULL) WITHOUT ROWID',
    `CREATE TABLE base (
      type TEXT NOT NULL, id TEXT NOT NULL, change_no INTEGER NOT NULL, building_id TEXT, beat_id TEXT,
      fields TEXT NOT NULL, PRIMARY KEY (type, id)
    ) WITHOUT ROWID`,
    'CREATE INDEX base_by_building ON base (building_id, type)',
    'CREATE INDEX base_by_beat ON base (beat_id, type)',
    'CREATE TABLE gone_sheet (id TEXT PRIMARY KEY, change_no INTEGER NOT NULL) WITHOUT ROWID',
    `CREATE TABLE outbox (
      mutation_id TEXT PRIMARY KEY, seq INTEGER NOT NULL, type TEXT NOT NULL, entity_id TEXT NOT NULL,
      building_id TEXT NOT NULL, payload TEXT NOT NULL, put_in_at TEXT NOT NULL, status TEXT, change_no INTEGER
    ) WITHOUT ROWID`,
    'CREATE UNIQUE INDEX outbox_by_seq ON outbox (seq)',
    'CREATE INDEX outbox_by_building ON outbox (building_id)',
    'CREATE TABLE draft (building_id TEXT PRIMARY KEY, answers TEXT NOT NULL, seen INTEGER NOT NULL, kept_at TEXT NOT NULL) WITHOUT ROWID',
    `CREATE TABLE quarantine (
      mutation_id TEXT PRIMARY KEY, type TEXT NOT NULL, building_id TEXT NOT NULL, payload TEXT NOT NULL,
      problem TEXT NOT NULL, set_apart_at TEXT NOT NULL
    ) WITHOUT ROWID`,
    `CREATE TABLE photo (
      photo_id TEXT PRIMARY KEY, sheet_id TEXT NOT NULL, meta TEXT NOT NULL, place TEXT NOT NULL,
      refusal TEXT, is_removed INTEGER NOT NULL DEFAULT 0
    ) WITHOUT ROWID`,
    'CREATE INDEX photo_by_sheet ON photo (sheet_id)',
  ],
  [
    `CREATE TABLE base_next (
      type TEXT NOT NULL, id TEXT NOT NULL, change_no INTEGER NOT NULL, building_id TEXT, beat_id TEXT,
      fields TEXT NOT NULL, PRIMARY KEY (type, id)
    ) WITHOUT ROWID`,
  ],
]

/** Brings the database to the newest version, all of it or nothing. */
export async function migrate(driver: Driver): Promise<void> {
  await driver.transaction(async (inside) => {
    const [row] = await inside.all<{ user_version: number }>('PRAGMA user_version')
    const from = row?.user_version ?? 0
    for (const statements of VERSIONS.slice(from)) {
      for (const statement of statements) await inside.run(statement)
    }
    if (from < VERSIONS.length) await inside.run(`PRAGMA user_version = ${VERSIONS.length}`)
  })
}
