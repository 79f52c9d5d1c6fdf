import { z } from 'zod'

/** One fault of an input: where (JSON pointer), which kind (stable code), and in words. */
export const fault = z.object({ pointer: z.string(), code: z.string(), detail: z.string() })
export type Fault = z.infer<typeof fault>

/** The one error shape of the wire, RFC 9457 with a stable code and all faults. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  code: z.string(),
  detail: z.string(),
  faults: z.array(fault).default([]),
  /** Number the server waits for: the next sequence number of a device, or the offset of an upload. */
  expected: z.number().int().optional(),
  requestId: z.string().optional(),
})
export type Problem = z.infer<typeof problem>
