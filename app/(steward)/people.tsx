import { PeopleScreen } from '@/components/people/PeopleScreen'

export default function PeopleRoute() {
  return <PeopleScreen />
}
