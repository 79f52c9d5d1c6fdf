import { PublishScreen } from '@/components/publish/PublishScreen'

export default function PublishRoute() {
  return <PublishScreen />
}
