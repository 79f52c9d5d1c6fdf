import { Share } from 'react-native'

/** Offers the text to the system's own share sheet. */
export function downloadText(fileName: string, text: string, _mime: string): void {
  void Share.share({ title: fileName, message: text })
}
