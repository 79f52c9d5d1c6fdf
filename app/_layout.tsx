import { Slot } from 'expo-router'
import { AppProviders } from '@/components/session/AppProviders'
import { UpdateNotice } from '@/components/session/UpdateNotice'
import { useAppFonts } from '@/components/ui/theme/useAppFonts'

export default function RootLayout() {
  const hasFonts = useAppFonts()
  if (!hasFonts) return null
  return (
    <AppProviders>
      <UpdateNotice />
      <Slot />
    </AppProviders>
  )
}
