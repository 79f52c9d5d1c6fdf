import { compareFigures, type Disagreement } from './compareFigures'
import type { ConformanceCheck, MethodRegister } from './check.types'

const COUNTER_EXAMPLE = 'counter-example'
/** An input of this form takes over the inputs of another check, named by its id. */
const REFERENCE_KEY = /_(as|as_in|from)$/

/** What became of one check. */
export interface Verdict {
  readonly id: string
  readonly method: string
  readonly disagreements: readonly Disagreement[]
}

/**
 * Computes one check from its method and inputs and compares it with what is expected.
 *
 * @param others checks another check's inputs may refer to
 */
export function judgeCheck(
  check: ConformanceCheck,
  others: readonly ConformanceCheck[],
  register: MethodRegister,
): Verdict {
  const { id, method, expected, tolerance } = check
  try {
    const got = computeCheck(check, others, register)
    const readings = hasAlternatives(got) ? got.alternatives : [got]
    const compared = readings.map((reading) => compareFigures(reading, expected, tolerance))
    const disagreements = compared.reduce((best, other) => (other.length < best.length ? other : best))
    return { id, method, disagreements }
  } catch (fault) {
    const got = fault instanceof Error ? `refused: ${fault.message}` : String(fault)
    return { id, method, disagreements: [{ key: method, got, expected: 'a figure' }] }
  }
}

/** Figures whose names may be read in more than one way: the reading that agrees as a whole is meant. */
function hasAlternatives(got: unknown): got is { readonly alternatives: readonly unknown[] } {
  return typeof got === 'object' && got !== null && 'alternatives' in got && Array.isArray(got.alternatives)
}

function computeCheck(check: ConformanceCheck, others: readonly ConformanceCheck[], register: MethodRegister): unknown {
  const inputs = withReferences(check.inputs, others)
  if (check.method !== COUNTER_EXAMPLE) {
    const compute = register.methods[check.method]
    if (compute === undefined) throw new Error(`unknown method "${check.method}"`)
    return compute(inputs)
  }
  for (const compute of register.counterExamples) {
    const got = compute(inputs)
    if (got !== undefined) return got
  }
  throw new Error('no counter-example function knows these inputs')
}

function withReferences(
  inputs: Readonly<Record<string, unknown>>,
  others: readonly ConformanceCheck[],
): Readonly<Record<string, unknown>> {
  const referred = Object.entries(inputs)
    .filter(([key, value]) => REFERENCE_KEY.test(key) && typeof value === 'string')
    .map(([, value]) => others.find((other) => other.id === value))
  return referred.reduce((merged, other) => ({ ...other?.inputs, ...merged }), inputs)
}
