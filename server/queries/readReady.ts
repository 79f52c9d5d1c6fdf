import type { Context } from '@/server/context'
import { LAST_MIGRATION } from '@/server/migrate'

/** Which of the parts a request needs are there. Never throws. */
export async function readReady({
  database,
  queue,
}: Pick<Context, 'database' | 'queue'>): Promise<{ database: boolean; migrations: boolean; queue: boolean }> {
  const [canRead, hasMigrations, hasQueue] = await Promise.all([
    answers(() => database.selectPublic('SELECT 1')),
    answers(() => database.selectPublic('SELECT name FROM schema_step WHERE name = $name', { name: LAST_MIGRATION })),
    queue.isReady().catch(() => false),
  ])
  return { database: canRead, migrations: hasMigrations, queue: hasQueue }
}

async function answers(read: () => Promise<object[]>): Promise<boolean> {
  try {
    return (await read()).length > 0
  } catch {
    return false
  }
}
