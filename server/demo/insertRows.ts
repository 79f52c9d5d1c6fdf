import { QueryTypes, type Sequelize, type Transaction } from 'sequelize'

/**
 * Inserts many rows as one JSON parameter. Columns are those of the first row; geometry goes as EWKT text.
 * Column names come from our own code, never from input.
 */
export async function insertRows(
  sequelize: Sequelize,
  transaction: Transaction,
  table: string,
  rows: readonly Readonly<Record<string, unknown>>[],
): Promise<void> {
  const [first] = rows
  if (!first) return
  const columns = Object.keys(first).join(', ')
  for (let start = 0; start < rows.length; start += 2_000) {
    await sequelize.query(
      `INSERT INTO ${table} (${columns}) SELECT ${columns} FROM json_populate_recordset(null::${table}, $rows::json)`,
      { bind: { rows: JSON.stringify(rows.slice(start, start + 2_000)) }, type: QueryTypes.RAW, transaction },
    )
  }
}
