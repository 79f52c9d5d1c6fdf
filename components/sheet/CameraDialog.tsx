import { CameraView, useCameraPermissions } from 'expo-camera'
import { useEffect, useRef, useState } from 'react'
import { StyleSheet, View } from 'react-native'
import { AppText } from '@/components/ui/AppText'
import { Button } from '@/components/ui/Button'
import { Dialog } from '@/components/ui/Dialog'
import { useMessages } from '@/components/ui/MessagesProvider'

interface CameraDialogProps {
  readonly isOpen: boolean
  readonly onClose: () => void
  readonly onPicture: (picture: Blob) => void
}

/** The camera over the sheet, with one button. */
export function CameraDialog({ isOpen, onClose, onPicture }: CameraDialogProps) {
  const { t } = useMessages()
  const camera = useRef<CameraView>(null)
  const [permission, askPermission] = useCameraPermissions()
  const [isReady, setIsReady] = useState(false)
  const [hasFailed, setFailed] = useState(false)
  const isDenied = permission?.granted === false && !permission.canAskAgain
  useEffect(() => {
    if (isOpen && permission?.granted === false && permission.canAskAgain) void askPermission()
  }, [isOpen, permission, askPermission])
  // a camera that was ready for the last picture is not ready for this one
  useEffect(() => {
    if (!isOpen) setIsReady(false)
  }, [isOpen])
  const shoot = async () => {
    setFailed(false)
    const picture = await takePicture(camera.current)
    if (picture) onPicture(blobOf(picture.uri))
    else setFailed(true)
  }
  return (
    <Dialog
      title={t('sheet.photoTake')}
      isOpen={isOpen}
      onClose={onClose}
      actions={
        <Button icon="camera" grow label={t('sheet.shutter')} disabled={!isReady} onPress={() => void shoot()} />
      }
    >
      {isDenied ? <AppText tone="attention">{t('sheet.cameraDenied')}</AppText> : null}
      {hasFailed ? <AppText tone="attention">{t('sheet.cameraFailed')}</AppText> : null}
      {isOpen && permission?.granted ? (
        <View style={styles.frame}>
          <CameraView ref={camera} facing="back" style={styles.camera} onCameraReady={() => setIsReady(true)} />
        </View>
      ) : null}
    </Dialog>
  )
}

const MOST_TRIES = 15
const BETWEEN_TRIES_MS = 200

/** A camera says it is ready a moment before its first frame is there: asked again until it has one. */
async function takePicture(camera: CameraView | null): Promise<{ uri: string } | null> {
  for (let tries = 0; camera && tries < MOST_TRIES; tries++) {
    try {
      const picture = await camera.takePictureAsync({ quality: 0.9, imageType: 'jpg' })
      if (picture) return picture
    } catch {
      // no frame yet
    }
    await new Promise((resolve) => setTimeout(resolve, BETWEEN_TRIES_MS))
  }
  return null
}

/** The bytes of a data URI. */
function blobOf(uri: string): Blob {
  const [head = '', body = ''] = uri.split(',', 2)
  const bytes = Uint8Array.from(atob(body), (character) => character.charCodeAt(0))
  return new Blob([bytes], { type: head.includes('png') ? 'image/png' : 'image/jpeg' })
}

const styles = StyleSheet.create({
  frame: { height: 320, overflow: 'hidden' },
  camera: { flex: 1 },
})
