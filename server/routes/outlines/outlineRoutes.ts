import { Router } from 'express'
import { confirmImport } from '@/server/commands/confirmImport'
import { discardImport } from '@/server/commands/discardImport'
import { drawDistrict } from '@/server/commands/drawDistrict'
import { stageOutlines } from '@/server/commands/stageOutlines'
import type { Context } from '@/server/context'
import { receiveFile } from '@/server/middleware/receiveFile'
import { FILE_BYTES, tooLarge } from '@/server/outlines/unpackFile'
import { readDistrictBlocks, readDistrictOutlines } from '@/server/queries/readDistrictMap'
import { readDistricts } from '@/server/queries/readDistricts'
import { readStagedFeatures } from '@/server/queries/readStagedFeatures'
import { mount } from '@/server/routes/mount'
import * as endpoints from '@/shared/api/outlines'

const READ_ONLY = { readOnly: true }

/** Outlines of buildings: their import, and the districts they lie in. */
export function outlineRoutes(context: Context): Router {
  const router = Router()
  mountImports(router, context)
  mountDistricts(router, context)
  return router
}

function mountImports(router: Router, context: Context): void {
  mount(
    router,
    endpoints.uploadOutlines,
    async ({ signedIn, request }) => {
      const { originalname: name = '', buffer: bytes = Buffer.alloc(0) } = request.file ?? {}
      return stageOutlines(context, signedIn, { name, bytes })
    },
    [receiveFile(FILE_BYTES, tooLarge)],
  )

  mount(router, endpoints.previewImport, async ({ signedIn, params }) => {
    const { features } = await context.database.withScope(
      signedIn,
      (scope) => readStagedFeatures(scope, params.importId),
      READ_ONLY,
    )
    return {
      type: 'FeatureCollection' as const,
      features: features.map(({ index, geometry }) => ({
        type: 'Feature' as const,
        id: index,
        geometry,
        properties: { index },
      })),
    }
  })

  mount(router, endpoints.confirmImport, ({ signedIn, params, body }) =>
    confirmImport(context, signedIn, params.importId, body),
  )

  mount(router, endpoints.discardImport, async ({ signedIn, params }) => {
    await discardImport(context, signedIn, params.importId)
    return {}
  })
}

function mountDistricts(router: Router, context: Context): void {
  const { database } = context

  mount(router, endpoints.listDistricts, async ({ signedIn }) => ({
    districts: await database.withScope(signedIn, (scope) => readDistricts(scope), READ_ONLY),
  }))

  mount(router, endpoints.drawDistrict, ({ signedIn, body }) => drawDistrict(context, signedIn, body))

  mount(router, endpoints.readDistrictOutlines, ({ signedIn, params }) =>
    database.withScope(signedIn, (scope) => readDistrictOutlines(scope, params.districtId), READ_ONLY),
  )

  mount(router, endpoints.readDistrictBlocks, ({ signedIn, params }) =>
    database.withScope(signedIn, (scope) => readDistrictBlocks(scope, params.districtId), READ_ONLY),
  )
}
