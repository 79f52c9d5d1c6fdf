export interface SuiteCount {
  readonly passed: number
  readonly failed: number
  readonly skipped: number
}

export interface VitestReport {
  readonly success: boolean
  readonly numPassedTests: number
  readonly numFailedTests: number
  readonly numPendingTests: number
  readonly numTodoTests: number
  readonly testResults: readonly {
    readonly status: string
    readonly assertionResults: readonly { readonly status: string }[]
  }[]
}

export interface PlaywrightReport {
  readonly stats: {
    readonly expected: number
    readonly unexpected: number
    readonly flaky: number
    readonly skipped: number
  }
  readonly errors: readonly unknown[]
}

export function countVitest(report: VitestReport): SuiteCount
export function countPlaywright(report: PlaywrightReport): SuiteCount
export function closingLine(counts: readonly SuiteCount[]): string
