import { View } from 'react-native'
import { AppText } from './AppText'
import { Button } from './Button'
import type { FileButtonProps } from './FileButton.types'
import { useMessages } from './MessagesProvider'

/** Files are chosen in the web app; here the button says so. */
export function FileButton({ label, kind, icon = 'upload' }: FileButtonProps) {
  const { t } = useMessages()
  return (
    <View>
      <Button label={label} kind={kind} icon={icon} disabled />
      <AppText soft>{t('common.filesOnWeb')}</AppText>
    </View>
  )
}
