import type { NavEntry } from '@/components/ui/AppFrame.types'
import type { Translate } from '@/shared/messages/messages.types'

/** The four places of the field. @param waiting sheets in the bag, shown at its tab */
export function fieldEntries(t: Translate, waiting: number): NavEntry[] {
  return [
    { href: '/today', label: t('nav.today'), icon: 'home' },
    { href: '/street', label: t('nav.street'), icon: 'map' },
    { href: '/bag', label: t('nav.bag'), icon: 'bag', badge: waiting },
    { href: '/me', label: t('nav.me'), icon: 'person' },
  ]
}
