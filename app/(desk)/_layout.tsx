import { Slot } from 'expo-router'
import { SideFrame } from '@/components/session/SideFrame'

export default function DeskLayout() {
  return (
    <SideFrame role="planner">
      <Slot />
    </SideFrame>
  )
}
