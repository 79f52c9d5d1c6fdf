import type { ConformanceInputs } from './inputs'
import type { Tolerance } from './compareFigures'

/** One reference figure as it stands in a check file. */
export interface ConformanceCheck {
  readonly id: string
  readonly method: string
  readonly inputs: Readonly<Record<string, unknown>>
  readonly expected: unknown
  readonly tolerance: Tolerance
}

/** Computes what one method asks for, from its inputs alone. */
export type ConformanceMethod = (inputs: ConformanceInputs) => unknown

/** Everything the runner can compute. A counter-example function answers undefined when the mistake is not its own. */
export interface MethodRegister {
  readonly methods: Readonly<Record<string, ConformanceMethod>>
  readonly counterExamples: readonly ConformanceMethod[]
}
