import type { NavEntry } from '@/components/ui/AppFrame.types'
import type { Messages } from '@/shared/messages/messages.types'
import type { Role } from '@/shared/schemas/person'

type Translate = Messages['t']

/** Entries of every side a person has; each side has its head where there are several. */
export function sideEntries(roles: readonly Role[], t: Translate, waitingCount = 0): NavEntry[] {
  const sides: readonly (readonly [Role, string, readonly NavEntry[]])[] = [
    ['planner', t('nav.desk'), deskEntries(t, waitingCount)],
    [
      'contractor',
      t('nav.yard'),
      [
        { href: '/loads-ahead', label: t('nav.loadsAhead'), icon: 'loads' },
        { href: '/listed-buildings', label: t('nav.listed'), icon: 'listed' },
      ],
    ],
    ['steward', t('nav.steward'), [{ href: '/people', label: t('nav.people'), icon: 'people' }]],
    ['surveyor', t('nav.field'), [{ href: '/today', label: t('nav.today'), icon: 'home' }]],
  ]
  const mine = sides.filter(([role]) => roles.includes(role))
  return mine.flatMap(([, group, entries]) =>
    mine.length > 1 ? entries.map((entry) => ({ ...entry, group })) : entries,
  )
}

function deskEntries(t: Translate, waitingCount: number): NavEntry[] {
  return [
    { href: '/district', label: t('nav.district'), icon: 'district' },
    { href: '/rounds', label: t('nav.rounds'), icon: 'rounds' },
    { href: '/review', label: t('nav.review'), icon: 'review', badge: waitingCount },
    { href: '/stock', label: t('nav.stock'), icon: 'stock' },
    { href: '/years-ahead', label: t('nav.yearsAhead'), icon: 'years-ahead' },
    { href: '/look-next', label: t('nav.lookNext'), icon: 'locate' },
    { href: '/compare', label: t('nav.compare'), icon: 'runs' },
    { href: '/publish', label: t('nav.publish'), icon: 'loads' },
    { href: '/listed', label: t('nav.listed'), icon: 'listed' },
    { href: '/factor-book', label: t('nav.factorBook'), icon: 'factor-book' },
  ]
}
