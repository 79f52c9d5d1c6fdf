import { useCallback, useEffect, useState } from 'react'
import { Image, StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Choice } from '@/components/ui/Choice'
import { FileButton } from '@/components/ui/FileButton'
import { IconButton } from '@/components/ui/IconButton'
import { useMessages } from '@/components/ui/MessagesProvider'
import { Panel } from '@/components/ui/Panel'
import { SPACE } from '@/components/ui/theme/tokens'
import type { FieldStore, StoredPhoto } from '@/db/fieldStore.types'
import { PHOTO_TAGS, type PhotoMeta } from '@/shared/schemas/sheet'
import { useField, useStored } from '@/sync/react/FieldProvider'
import { CameraDialog } from './CameraDialog'
import { PhotoFaults } from './PhotoFaults'
import { MOST_PHOTOS, usePhotoIntake } from './usePhotoIntake'

type Tag = PhotoMeta['tag']

interface PhotosSectionProps {
  readonly sheetId: string
  readonly isCameraOpen: boolean
  readonly onCamera: (isOpen: boolean) => void
}

/** Up to twelve photos, each redrawn without metadata and kept at once. */
export function PhotosSection({ sheetId, isCameraOpen, onCamera }: PhotosSectionProps) {
  const { t } = useMessages()
  const photos = useStored(useCallback((from: FieldStore) => from.listPhotos(sheetId), [sheetId])) ?? []
  const [tag, setTag] = useState<Tag>('street-front')
  const { take, remove, faults, isBusy } = usePhotoIntake(sheetId)
  const isFull = photos.length >= MOST_PHOTOS
  return (
    <Panel title={t('sheet.sections.photos')} note={t('common.photos', { count: photos.length })}>
      {photos.length === 0 ? <AppText soft>{t('sheet.photosNone')}</AppText> : null}
      <View style={styles.photos}>
        {photos.map((stored, index) => (
          <Photo
            key={stored.photo.photoId}
            stored={stored}
            number={index + 1}
            onRemove={() => void remove(stored.photo.photoId)}
          />
        ))}
      </View>
      <PhotoFaults faults={faults} />
      {isFull ? <AppText soft>{t('sheet.photoMost')}</AppText> : null}
      <Choice<Tag>
        label={t('sheet.photoTag')}
        value={tag}
        onChange={setTag}
        options={PHOTO_TAGS.map((value) => ({ value, label: t(`vocabulary.photoTag.${value}`) }))}
      />
      <View style={styles.row}>
        <Button
          kind="secondary"
          icon="camera"
          grow
          label={t('sheet.photoTake')}
          disabled={isFull}
          busy={isBusy}
          onPress={() => onCamera(true)}
        />
        <FileButton
          kind="secondary"
          grow
          label={t('sheet.photoChoose')}
          accept="image/*"
          multiple
          disabled={isFull}
          onFiles={(files) => take(files, tag)}
        />
      </View>
      <CameraDialog
        isOpen={isCameraOpen}
        onClose={() => onCamera(false)}
        onPicture={(picture) => {
          onCamera(false)
          take([picture], tag)
        }}
      />
    </Panel>
  )
}

interface PhotoProps {
  readonly stored: StoredPhoto
  readonly number: number
  readonly onRemove: () => void
}

function Photo({ stored, number, onRemove }: PhotoProps) {
  const { t } = useMessages()
  const uri = usePhotoUri(stored.photo.sha256)
  const tag = t(`vocabulary.photoTag.${stored.photo.tag}`)
  const place = stored.refusal ?? t(`bag.${stored.place}`)
  return (
    <View style={styles.photo}>
      {uri ? (
        <Image source={{ uri }} style={styles.image} accessibilityLabel={t('sheet.photoOf', { number, tag, place })} />
      ) : null}
      <View style={styles.row}>
        <View style={styles.words}>
          <AppText size="small">{tag}</AppText>
          <AppText size="small" soft tone={stored.refusal ? 'error' : undefined}>
            {place}
          </AppText>
        </View>
        <IconButton icon="close" label={t('sheet.photoRemove', { number })} onPress={onRemove} />
      </View>
    </View>
  )
}

/** Address of a kept picture for as long as it is shown. */
function usePhotoUri(sha256: string): string | null {
  const { store } = useField()
  const [uri, setUri] = useState<string | null>(null)
  useEffect(() => {
    let made: string | null = null
    let isLeft = false
    store.readPhotoBytes(sha256).then(
      (bytes) => {
        if (!bytes || isLeft) return
        made = URL.createObjectURL(new Blob([new Uint8Array(bytes)], { type: 'image/jpeg' }))
        setUri(made)
      },
      () => undefined,
    )
    return () => {
      isLeft = true
      if (made) URL.revokeObjectURL(made)
    }
  }, [store, sha256])
  return uri
}

const styles = StyleSheet.create({
  photos: { flexDirection: 'row', flexWrap: 'wrap', gap: SPACE.small },
  photo: { width: 150 },
  image: { width: 150, height: 112, resizeMode: 'cover' },
  row: { flexDirection: 'row', alignItems: 'center', gap: SPACE.small },
  words: { flex: 1 },
})
