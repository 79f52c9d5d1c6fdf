import { Slot } from 'expo-router'
import { SideFrame } from '@/components/session/SideFrame'

export default function StewardLayout() {
  return (
    <SideFrame role="steward">
      <Slot />
    </SideFrame>
  )
}
