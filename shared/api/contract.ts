import * as auth from './auth'
import type { Endpoint } from './defineEndpoint'
import * as factorBook from './factorBook'
import * as health from './health'
import * as nextLook from './nextLook'
import * as listings from './listings'
import * as openapi from './openapi'
import * as outlines from './outlines'
import * as people from './people'
import * as publications from './publications'
import * as quarantine from './quarantine'
import * as receipts from './receipts'
import * as review from './review'
import * as rounds from './rounds'
import * as runs from './runs'
import * as sync from './sync'
import * as yard from './yard'

/** Every endpoint of the product, by name: the route table that server, tests and documents walk. */
export const contract: Readonly<Record<string, Endpoint>> = Object.freeze(
  Object.fromEntries(
    [
      auth,
      people,
      outlines,
      rounds,
      sync,
      quarantine,
      review,
      factorBook,
      runs,
      publications,
      yard,
      listings,
      nextLook,
      receipts,
      health,
      openapi,
    ].flatMap((resource) => Object.entries(resource).filter(([, value]) => isEndpoint(value))),
  ) as Record<string, Endpoint>,
)

function isEndpoint(value: unknown): value is Endpoint {
  return typeof value === 'object' && value !== null && 'method' in value && 'audience' in value && 'path' in value
}
