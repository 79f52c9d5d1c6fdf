import type { Account } from '@/shared/schemas/person'

/** The person behind a request, read from the database at each request, never from the token. */
export interface SignedIn extends Account {
  readonly sessionId: string
  readonly deviceId: string
}

declare module 'express-serve-static-core' {
  interface Request {
    signedIn?: SignedIn
    requestId?: string
  }
}
