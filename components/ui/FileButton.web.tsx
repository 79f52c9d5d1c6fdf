import { useRef } from 'react'
import { View } from 'react-native'
import { Button } from './Button'
import type { FileButtonProps } from './FileButton.types'

/** Opens the browser's own choice of files. */
export function FileButton(props: FileButtonProps) {
  const { label, accept, onFiles, multiple = false, camera = false, kind, icon = 'upload' } = props
  const input = useRef<HTMLInputElement>(null)
  return (
    <View style={props.grow ? { flexGrow: 1, flexShrink: 1 } : undefined}>
      <input
        ref={input}
        type="file"
        accept={accept}
        multiple={multiple}
        capture={camera ? 'environment' : undefined}
        aria-label={label}
        tabIndex={-1}
        hidden
        onChange={(event) => {
          const files = [...(event.target.files ?? [])]
          // The same file chosen twice must be told twice.
          event.target.value = ''
          if (files.length > 0) onFiles(files)
        }}
      />
      <Button
        label={label}
        kind={kind}
        icon={icon}
        busy={props.busy}
        disabled={props.disabled}
        onPress={() => input.current?.click()}
      />
    </View>
  )
}
