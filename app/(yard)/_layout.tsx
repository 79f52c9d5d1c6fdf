import { Slot } from 'expo-router'
import { SideFrame } from '@/components/session/SideFrame'

export default function YardLayout() {
  return (
    <SideFrame role="contractor">
      <Slot />
    </SideFrame>
  )
}
