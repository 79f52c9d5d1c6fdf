/** What may be logged of an error. */
export interface DescribedFault {
  readonly name: string
  readonly code?: string
  readonly message?: string
  readonly stack?: string
}

/**
 * An error without personal data. Errors of the database carry the values that were bound, in their message, detail
 * and parameters, so only their name and code go to the log; other errors bring message and stack.
 */
export function describeFault(error: unknown): DescribedFault {
  if (!(error instanceof Error)) return { name: typeof error }
  const { original, code } = error as Error & { original?: { code?: unknown }; code?: unknown }
  const databaseCode = isText(original?.code) ? original.code : isText(code) ? code : undefined
  if (original !== undefined || error.name.startsWith('Sequelize') || /^[0-9A-Z]{5}$/.test(databaseCode ?? '')) {
    return { name: error.name, ...(databaseCode === undefined ? {} : { code: databaseCode }), stack: places(error) }
  }
  return { name: error.name, message: error.message, stack: places(error) }
}

/** Lines of the stack that say where, without the first that repeats the message. */
function places({ stack = '' }: Error): string {
  return stack
    .split('\n')
    .filter((line) => line.trimStart().startsWith('at '))
    .slice(0, 12)
    .join('\n')
}

function isText(value: unknown): value is string {
  return typeof value === 'string'
}
