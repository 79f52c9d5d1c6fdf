import type { Router } from 'express'
import type { Context } from '@/server/context'
import { authRoutes } from './auth/authRoutes'
import { factorBookRoutes } from './factorBook/factorBookRoutes'
import { healthRoutes } from './health/healthRoutes'
import { nextLookRoutes } from './nextLook/nextLookRoutes'
import { listingRoutes } from './listings/listingRoutes'
import { openapiRoutes } from './openapi/openapiRoutes'
import { outlineRoutes } from './outlines/outlineRoutes'
import { peopleRoutes } from './people/peopleRoutes'
import { photoRoutes } from './photos/photoRoutes'
import { publicationRoutes } from './publications/publicationRoutes'
import { quarantineRoutes } from './quarantine/quarantineRoutes'
import { receiptRoutes } from './receipts/receiptRoutes'
import { reviewRoutes } from './review/reviewRoutes'
import { roundRoutes } from './rounds/roundRoutes'
import { runRoutes } from './runs/runRoutes'
import { syncRoutes } from './sync/syncRoutes'
import { yardRoutes } from './yard/yardRoutes'

/** The routes of every resource; each knows its endpoints of the contract. */
export const allRoutes: readonly ((context: Context) => Router)[] = [
  healthRoutes,
  authRoutes,
  peopleRoutes,
  outlineRoutes,
  roundRoutes,
  syncRoutes,
  photoRoutes,
  quarantineRoutes,
  reviewRoutes,
  factorBookRoutes,
  runRoutes,
  nextLookRoutes,
  receiptRoutes,
  publicationRoutes,
  yardRoutes,
  listingRoutes,
  openapiRoutes,
]
