import type { Outline } from '@/shared/schemas/outline'
import type { SheetAnswers } from '@/shared/schemas/sheet'

/** What outline and register say before anybody looked: offered in the form, and marked until it is confirmed. */
export function answersFromRegister({ footprintM2, register }: Outline): SheetAnswers {
  const storeys = register.storeys === null ? null : Math.round(register.storeys * 2) / 2
  const mark = { knownBy: 'register', unconfirmed: 'register' } as const
  return {
    finding: { kind: 'standing', unconfirmed: 'register' },
    footprint: { footprintM2, ...mark },
    ...(register.use ? { use: { use: register.use, ...mark } } : {}),
    ...(storeys ? { storeys: { aboveGround: storeys, ...mark } } : {}),
    ...(register.year ? { constructionYear: { kind: 'exact', year: register.year, ...mark } } : {}),
  }
}
