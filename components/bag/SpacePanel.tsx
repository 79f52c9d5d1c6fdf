import { useCallback, useEffect, useState } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { formatBytes } from '@/shared/format'

interface Space {
  readonly usedBytes: number | null
  readonly quotaBytes: number | null
  readonly isPersisted: boolean
}

async function readSpace(): Promise<Space> {
  const storage = globalThis.navigator?.storage
  const estimate = (await storage?.estimate?.()) ?? {}
  return {
    usedBytes: estimate.usage ?? null,
    quotaBytes: estimate.quota ?? null,
    isPersisted: (await storage?.persisted?.()) ?? false,
  }
}

/** Space used, and whether the browser may clear it by itself. */
export function SpacePanel() {
  const { t, locale } = useMessages()
  const [space, setSpace] = useState<Space | null>(null)
  const [isAsked, setIsAsked] = useState(false)
  const read = useCallback(() => void readSpace().then(setSpace, () => undefined), [])
  useEffect(read, [read])
  const ask = async () => {
    await globalThis.navigator?.storage?.persist?.()
    setIsAsked(true)
    read()
  }
  if (!space) return null
  const { usedBytes, quotaBytes, isPersisted } = space
  return (
    <Panel title={t('bag.space')}>
      {usedBytes !== null && quotaBytes ? (
        <Progress
          label={t('bag.spaceUsed', { used: formatBytes(usedBytes, locale), quota: formatBytes(quotaBytes, locale) })}
          share={usedBytes / quotaBytes}
        />
      ) : (
        <AppText soft>{t('bag.spaceUnknown')}</AppText>
      )}
      <AppText>{t(isPersisted ? 'bag.persisted' : isAsked ? 'bag.stillNotPersisted' : 'bag.notPersisted')}</AppText>
      {isPersisted || isAsked ? null : (
        <Button kind="secondary" label={t('bag.askToKeep')} onPress={() => void ask()} />
      )}
    </Panel>
  )
}
