import { ImportScreen } from '@/components/rounds/ImportScreen'

export default function ImportRoute() {
  return <ImportScreen />
}
