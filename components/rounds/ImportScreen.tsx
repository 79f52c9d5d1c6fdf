import { useMutation } from '@tanstack/react-query'
import { useRouter, type Href } from 'expo-router'
import { useState } from 'react'
import { ProblemNotice } from '@/components/runs/ProblemNotice'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { FileButton } from '@/components/ui/FileButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { Screen } from '@/components/ui/Screen'
import { stagedImport, type StagedImport } from '@/shared/api/outlines'
import { formatCount } from '@/shared/format'
import { useApi } from '@/sync/react/SessionProvider'
import { ImportMapping, type ImportDone } from './ImportMapping'

/** From a file of building outlines to a district: look first, then import all or nothing. */
export function ImportScreen() {
  const { t, locale } = useMessages()
  const api = useApi()
  const router = useRouter()
  const [staged, setStaged] = useState<StagedImport | null>(null)
  const [done, setDone] = useState<ImportDone | null>(null)
  const upload = useMutation({
    mutationFn: async (file: File) => {
      const form = new FormData()
      form.append('file', file)
      const response = await api.send('POST', '/outline-imports', { body: form })
      return stagedImport.parse(await response.json())
    },
    onSuccess: setStaged,
  })
  return (
    <Screen
      title={t('rounds.importOutlines')}
      subtitle={t('rounds.importSubtitle')}
      onBack={() => router.navigate('/rounds' as Href)}
      width="report"
    >
      {done ? (
        <Notice
          tone="good"
          whatHappened={t('rounds.imported', {
            imported: formatCount(done.importedCount, locale),
            left: formatCount(done.leftOutCount, locale),
            blocks: formatCount(done.blockCount, locale),
          })}
          whatToDo={t('rounds.importedNext')}
          action={<Button label={t('rounds.toRounds')} onPress={() => router.navigate('/rounds' as Href)} />}
        />
      ) : null}
      {!staged && !done ? (
        <Panel title={t('rounds.chooseFile')}>
          <AppText soft>{t('rounds.fileHint')}</AppText>
          {upload.error ? <ProblemNotice error={upload.error} /> : null}
          <FileButton
            label={t('rounds.chooseFile')}
            accept=".geojson,.json,.zip"
            busy={upload.isPending}
            onFiles={([file]) => file && upload.mutate(file)}
          />
        </Panel>
      ) : null}
      {staged && !done ? <ImportMapping staged={staged} onDone={setDone} onDiscard={() => setStaged(null)} /> : null}
    </Screen>
  )
}
