import { useCallback, useEffect, useState } from 'react'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { Progress } from '@/components/ui/Progress'
import { readStorageRoom, type StorageRoom } from '@/db/storageRoom'
import { formatBytes } from '@/shared/format'

interface Space extends StorageRoom {
  readonly isPersisted: boolean
}

async function readSpace(): Promise<Space> {
  const isPersisted = (await globalThis.navigator?.storage?.persisted?.()) ?? false
  return { ...(await readStorageRoom()), isPersisted }
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
  const { usedBytes, quotaBytes, isPersisted, level } = space
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
      {level === 'tight' ? (
        <Notice tone="attention" whatHappened={t('bag.spaceTight')} whatToDo={t('bag.spaceTightToDo')} />
      ) : null}
      {level === 'full' ? (
        <Notice tone="error" whatHappened={t('bag.spaceFull')} whatToDo={t('bag.spaceFullToDo')} />
      ) : null}
      <AppText>{t(isPersisted ? 'bag.persisted' : isAsked ? 'bag.stillNotPersisted' : 'bag.notPersisted')}</AppText>
      {isPersisted || isAsked ? null : (
        <Button kind="secondary" label={t('bag.askToKeep')} onPress={() => void ask()} />
      )}
    </Panel>
  )
}
