import { tidySync } from '@/server/commands/tidySync'
import type { Context } from '@/server/context'
import { describeFault } from '@/server/middleware/describeFault'

const FIRST_MS = 10 * 60_000
const DAY_MS = 24 * 60 * 60_000

/** Tidies every organisation some minutes after the start and once a day; one that fails does not keep the others. */
export function startTidying(context: Context): void {
  const run = () => void tidyAll(context)
  setTimeout(run, FIRST_MS).unref()
  setInterval(run, DAY_MS).unref()
}

/** Two servers that tidy at once do so one row after the other, and find nothing twice. */
export async function tidyAll(context: Context): Promise<void> {
  const { database, log } = context
  try {
    const rows = await database.selectPublic<{ organisation_id: string }>('SELECT * FROM organisations_to_tidy()')
    for (const { organisation_id: organisationId } of rows) {
      const tidied = await tidySync(context, organisationId)
      if (tidied.tombstones + tidied.uploads > 0) log.info({ organisationId, ...tidied }, 'tidied')
    }
  } catch (error) {
    log.error({ fault: describeFault(error) }, 'tidying failed')
  }
}
