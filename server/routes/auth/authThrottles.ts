import type { Request } from 'express'
import { z } from 'zod'
import type { Context } from '@/server/context'
import { throttleByAddress, throttleByKey, typedEmail } from '@/server/middleware/throttle'

const MINUTE_MS = 60_000
const REFRESHES_PER_SIGN_IN = 10
const FAILURES_PER_ACCOUNT = 10
const RESETS_PER_HOUR = 5

export type AuthThrottles = ReturnType<typeof authThrottles>

/** Brakes on guessing and flooding; one set a group of addresses. */
export function authThrottles({ config, database }: Pick<Context, 'config' | 'database'>) {
  return {
    byAddress: throttleByAddress(config.signInsPerMinute),
    ofRefresh: throttleByAddress(config.signInsPerMinute * REFRESHES_PER_SIGN_IN),
    /** A device that is enrolled for the account counts for itself, so strangers cannot lock the owner out. */
    byAccount: throttleByKey({
      windowMs: 15 * MINUTE_MS,
      limit: FAILURES_PER_ACCOUNT,
      countsFailuresOnly: true,
      key: async (request) => {
        const email = typedEmail(request)
        const deviceId = claimedDevice(request)
        if (deviceId === undefined) return email
        const [row] = await database.selectPublic<{ is_known: boolean }>(
          'SELECT is_device_of($email, $deviceId) AS is_known',
          { email, deviceId },
        )
        return row?.is_known ? `${email} ${deviceId}` : email
      },
    }),
    ofResets: throttleByKey({ windowMs: 60 * MINUTE_MS, limit: RESETS_PER_HOUR, key: typedEmail }),
  }
}

function claimedDevice(request: Request): string | undefined {
  const claim = z.object({ device: z.object({ deviceId: z.uuid() }) }).safeParse(request.body)
  return claim.success ? claim.data.device.deviceId : undefined
}
