import { Router } from 'express'
import { presentOpenApi } from '@/server/presenters/presentOpenApi'
import { mount } from '@/server/routes/mount'
import { VERSION } from '@/server/version'
import { contract } from '@/shared/api/contract'
import { readOpenApi } from '@/shared/api/openapi'

/** The contract, for programs of others. */
export function openapiRoutes(): Router {
  const router = Router()
  const document = presentOpenApi(contract, VERSION)
  mount(router, readOpenApi, async () => document)
  return router
}
