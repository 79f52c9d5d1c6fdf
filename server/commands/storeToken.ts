import type { Scope } from '@/server/database'
import { LINK_LASTS_MS } from '@/server/auth/oneTimeToken'

/** Keeps the digest of a one-time token for the acting person; earlier tokens of the purpose stop working. */
export async function storeToken(
  scope: Scope,
  { purpose, tokenSha256, now }: { purpose: keyof typeof LINK_LASTS_MS; tokenSha256: string; now: Date },
): Promise<void> {
  const { organisationId, personId } = scope
  await scope.execute(
    `UPDATE one_time_token SET used_at = $now
     WHERE organisation_id = $organisationId AND person_id = $personId AND purpose = $purpose AND used_at IS NULL`,
    { organisationId, personId, purpose, now },
  )
  await scope.execute(
    `INSERT INTO one_time_token (organisation_id, token_sha256, person_id, purpose, expires_at, created_at)
     VALUES ($organisationId, $tokenSha256, $personId, $purpose, $expiresAt, $now)`,
    {
      organisationId,
      personId,
      purpose,
      tokenSha256,
      now,
      expiresAt: new Date(now.getTime() + LINK_LASTS_MS[purpose]),
    },
  )
}
