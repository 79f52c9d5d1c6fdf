import { Refusal } from '@/server/errors'

const TRIES = 3
/** Serialisation failure, deadlock, a lock that was not got in time, a statement that took too long. */
const CONTENTION: ReadonlySet<string> = new Set(['40001', '40P01', '55P03', '57014'])
/** The connection or the database went away; the next request may find another. */
const AWAY: ReadonlySet<string> = new Set(['57P01', '57P02', '57P03', '08006', '08003', 'ECONNREFUSED', 'ECONNRESET'])
const RETRY_AFTER_S = 2

/**
 * Runs a whole transaction again when it met another: at most three tries, then 503, with nothing half (rule P11).
 *
 * @param work opens its own transaction; runs from its start each time
 * @throws {Refusal} `busy` when every try failed so
 */
export async function retryOnContention<Result>(work: () => Promise<Result>): Promise<Result> {
  for (let tryNo = 1; ; tryNo += 1) {
    try {
      return await work()
    } catch (error) {
      const code = codeOf(error)
      if (AWAY.has(code) || (error instanceof Error && error.name.startsWith('SequelizeConnection'))) throw busy()
      if (!CONTENTION.has(code)) throw error
      if (tryNo === TRIES) throw busy()
    }
  }
}

function codeOf(error: unknown): string {
  if (!(error instanceof Error)) return ''
  const { original, code } = error as Error & { original?: { code?: unknown }; code?: unknown }
  return String(original?.code ?? code ?? '')
}

const busy = () =>
  new Refusal(
    503,
    'busy',
    'The server is busy with other work. Nothing was changed, and what you sent is safe where it is; it is sent again in a moment.',
    [],
    { 'Retry-After': String(RETRY_AFTER_S) },
  )
