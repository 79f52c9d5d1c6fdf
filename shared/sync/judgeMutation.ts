import type { z } from 'zod'
import type { Fault } from '@/shared/schemas/problem'
import { deleteMutation, photoMutation, resolveMutation, sheetMutation, type Mutation } from '@/shared/schemas/sync'
import { inspectPayload, LARGEST_MUTATION_BYTES, type PayloadFault } from './inspectPayload'
import { mutationFingerprint } from './mutationFingerprint'

/** Why a mutation cannot be used, with a stable code, in words, and place by place. */
export interface Unusable {
  readonly code: 'mutation-not-readable' | 'mutation-too-large' | 'mutation-not-usable'
  readonly detail: string
  readonly faults: readonly Fault[]
}

export type Judgement =
  | { readonly isUsable: true; readonly mutation: Mutation; readonly fingerprint: string }
  /** Without a fingerprint when the payload may not even be written out. */
  | { readonly isUsable: false; readonly unusable: Unusable; readonly fingerprint: string | null }

/**
 * Judges one mutation for itself: shape, size, ranges, and nothing beside the allowed fields. Phone and server ask the
 * same function, the server again because a phone may lie.
 */
export function judgeMutation(payload: object): Judgement {
  const payloadFault = inspectPayload(payload)
  if (payloadFault) return refuse('mutation-not-readable', PAYLOAD_FAULTS[payloadFault], null, payloadFault)
  const fingerprint = mutationFingerprint(payload)
  if (isTooLarge(fingerprint)) {
    return refuse('mutation-too-large', 'is larger than 64 KiB; write shorter notes', fingerprint, 'too-large')
  }
  const result = schemaOf(payload).safeParse(payload)
  if (result.success) return { isUsable: true, mutation: result.data, fingerprint }
  return { isUsable: false, fingerprint, unusable: explain(result.error) }
}

const PAYLOAD_FAULTS: Readonly<Record<PayloadFault, string>> = {
  'too-deep': 'is nested too deeply',
  'too-many-keys': 'has too many fields',
  'forbidden-key': 'has a field whose name is not allowed',
  'text-not-well-formed': 'has a text with characters that cannot be kept',
}

function refuse(code: Unusable['code'], why: string, fingerprint: string | null, fault: string): Judgement {
  const detail = `This entry ${why}. It is set apart with all it says; the other entries go on.`
  return {
    isUsable: false,
    fingerprint,
    unusable: { code, detail, faults: [{ pointer: '', code: fault, detail: why }] },
  }
}

function explain(error: z.ZodError): Unusable {
  const faults = error.issues.map((issue) => ({
    pointer: `/${issue.path.map((step) => String(step).replaceAll('~', '~0').replaceAll('/', '~1')).join('/')}`,
    code: issue.code ?? 'invalid',
    detail: issue.message,
  }))
  const detail = `${faults.length === 1 ? 'One value' : `${faults.length} values`} cannot be used. This entry is set apart with all it says; the other entries go on.`
  return { code: 'mutation-not-usable', detail, faults }
}

type MutationSchema = typeof sheetMutation | typeof photoMutation | typeof deleteMutation | typeof resolveMutation

/** One schema by type and act, so that faults name fields and not the ways a union was tried. */
function schemaOf(payload: object): MutationSchema {
  const type: unknown = Reflect.get(payload, 'type')
  const op: unknown = Reflect.get(payload, 'op')
  if (op === 'resolve') return resolveMutation
  if (op === 'delete' || op === 'undelete') return deleteMutation
  return type === 'photo' ? photoMutation : sheetMutation
}

function isTooLarge(text: string): boolean {
  if (text.length > LARGEST_MUTATION_BYTES) return true
  return text.length * 3 > LARGEST_MUTATION_BYTES && new TextEncoder().encode(text).length > LARGEST_MUTATION_BYTES
}
