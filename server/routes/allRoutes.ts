import type { Router } from 'express'
import type { Context } from '@/server/context'
import { authRoutes } from './auth/authRoutes'
import { healthRoutes } from './health/healthRoutes'
import { outlineRoutes } from './outlines/outlineRoutes'
import { peopleRoutes } from './people/peopleRoutes'
import { roundRoutes } from './rounds/roundRoutes'
import { syncRoutes } from './sync/syncRoutes'

/** The routes of every resource; each knows its endpoints of the contract. */
export const allRoutes: readonly ((context: Context) => Router)[] = [
  healthRoutes,
  authRoutes,
  peopleRoutes,
  outlineRoutes,
  roundRoutes,
  syncRoutes,
]
