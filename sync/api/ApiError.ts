import type { Problem } from '@/shared/schemas/problem'

/** The server said no, in its one error shape. */
export class ApiError extends Error {
  override readonly name = 'ApiError'

  constructor(
    readonly problem: Problem,
    /** How long the server asks to wait [s]; null where it does not say. */
    readonly retryAfterS: number | null = null,
  ) {
    super(`${problem.status} ${problem.code}`)
  }

  get status(): number {
    return this.problem.status
  }

  get code(): string {
    return this.problem.code
  }
}

/** The server was not reached, or what answered was not the server. Nothing is known of what it did. */
export class UnreachableError extends Error {
  override readonly name = 'UnreachableError'
}
