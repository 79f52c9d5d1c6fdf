import { useQuery } from '@tanstack/react-query'
import { useMemo } from 'react'
import { Image, StyleSheet, View } from 'react-native'
import { OutlineMap } from '@/components/map/OutlineMap'
import { AppText } from '@/components/ui/AppText'
import { Badge } from '@/components/ui/Badge'
import { DataTable } from '@/components/ui/DataTable'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Notice } from '@/components/ui/Notice'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import { useTheme } from '@/components/ui/theme/ThemeProvider'
import { useWide } from '@/components/ui/theme/useWide'
import { TitleBlock } from '@/components/ui/TitleBlock'
import type { ReviewSheet } from '@/shared/api/review'
import { formatDate } from '@/shared/format'
import { revisionLetter } from '@/shared/schemas/sheet'
import { useApi } from '@/sync/react/SessionProvider'
import { answerLines } from './answerLines'
import { ConflictPanel } from './ConflictPanel'
import { photoQuery } from './reviewQueries'

/** Photo beside answers beside map, then conflicts and what went before. */
export function SheetReviewBody({ sheet }: { readonly sheet: ReviewSheet }) {
  const { t, locale } = useMessages()
  const isWide = useWide()
  return (
    <>
      {sheet.review.question ? (
        <Notice tone="attention" whatHappened={t('review.wasAsked', { question: sheet.review.question })} />
      ) : null}
      {sheet.flags.length > 0 ? (
        <View style={styles.flags}>
          {sheet.flags.map((flag) => (
            <Badge key={flag} tone="attention" label={t(`review.flag.${flag}`)} />
          ))}
        </View>
      ) : null}
      <View style={isWide ? styles.columns : styles.stack}>
        <Photos sheet={sheet} />
        <Answers sheet={sheet} />
        <Place sheet={sheet} />
      </View>
      {sheet.conflicts.map((conflict) => (
        <ConflictPanel key={conflict.conflictId} conflict={conflict} />
      ))}
      <Panel title={t('review.revisions')}>
        <DataTable
          label={t('review.revisions')}
          rows={sheet.revisions.map((revision, index) => ({ ...revision, key: `${revision.revision}-${index}` }))}
          rowKey={(revision) => revision.key}
          columns={[
            { key: 'rev', head: t('review.revision'), cell: (revision) => revisionLetter(revision.revision) },
            { key: 'state', head: t('review.state'), cell: (revision) => t(`vocabulary.state.${revision.state}`) },
            { key: 'by', head: t('review.by'), cell: (revision) => revision.byName },
            { key: 'at', head: t('review.at'), cell: (revision) => formatDate(revision.at, locale) },
          ]}
        />
      </Panel>
      <TitleBlock
        cells={[
          { label: t('common.titleBlock.number'), value: sheet.reference },
          { label: t('common.titleBlock.place'), value: sheet.label, weight: 2 },
          { label: t('common.titleBlock.by'), value: sheet.recordedByName },
          { label: t('common.titleBlock.date'), value: formatDate(sheet.recordedAt, locale) },
          { label: t('common.titleBlock.revision'), value: revisionLetter(sheet.revision) },
        ]}
      />
    </>
  )
}

function Photos({ sheet }: { readonly sheet: ReviewSheet }) {
  const { t } = useMessages()
  return (
    <Panel title={t('review.photos')} grow>
      {sheet.photos.length === 0 ? <AppText soft>{t('review.noPhoto')}</AppText> : null}
      {sheet.photos.map((photo) => (
        <Photo
          key={photo.photoId}
          photoId={photo.photoId}
          isStored={photo.state === 'stored'}
          label={t(`review.tag.${photo.tag}`)}
          ratio={photo.widthPx / photo.heightPx}
        />
      ))}
    </Panel>
  )
}

function Photo({
  photoId,
  isStored,
  label,
  ratio,
}: {
  readonly photoId: string
  readonly isStored: boolean
  readonly label: string
  readonly ratio: number
}) {
  const { t } = useMessages()
  const api = useApi()
  const photo = useQuery({ ...photoQuery(api, photoId), enabled: isStored })
  if (!isStored) return <AppText soft>{t('review.photoComing', { label })}</AppText>
  if (photo.error) return <AppText soft>{t('review.photoMissing', { label })}</AppText>
  return photo.data ? (
    <Image
      source={{ uri: photo.data }}
      alt={label}
      style={[styles.photo, { aspectRatio: ratio }]}
      resizeMode="contain"
    />
  ) : null
}

function Answers({ sheet }: { readonly sheet: ReviewSheet }) {
  const messages = useMessages()
  const { t } = messages
  return (
    <Panel title={t('review.answers')} grow>
      <DataTable
        label={t('review.answers')}
        rows={answerLines(sheet, messages)}
        rowKey={(line) => line.key}
        columns={[
          { key: 'what', head: t('review.what'), cell: (line) => line.label },
          { key: 'answer', head: t('review.answer'), weight: 2, cell: (line) => line.value },
          { key: 'known', head: t('review.known'), cell: (line) => line.known },
        ]}
      />
    </Panel>
  )
}

function Place({ sheet }: { readonly sheet: ReviewSheet }) {
  const { t } = useMessages()
  const { colours } = useTheme()
  const outlines = useMemo(
    () => (sheet.geometry ? [{ id: sheet.sheetId, geometry: sheet.geometry, name: sheet.reference }] : []),
    [sheet.geometry, sheet.sheetId, sheet.reference],
  )
  const paint = useMemo(() => () => ({ fill: colours.selection, opacity: 0.7, outline: colours.rule }), [colours])
  const position = sheet.answers.position
  if (outlines.length === 0) return null
  return (
    <Panel title={t('review.place')} grow>
      <OutlineMap
        label={t('review.placeMap')}
        outlines={outlines}
        paint={paint}
        userPosition={position ?? null}
        fitKey={sheet.sheetId}
        heightPx={260}
      />
    </Panel>
  )
}

const styles = StyleSheet.create({
  columns: { flexDirection: 'row', gap: SPACE.large, alignItems: 'flex-start' },
  stack: { gap: SPACE.large },
  flags: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.tight },
  photo: { width: '100%', marginBottom: SPACE.small },
})
