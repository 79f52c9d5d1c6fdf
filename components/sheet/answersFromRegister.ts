import type { Outline } from '@/shared/schemas/outline'
import type { SheetAnswers } from '@/shared/schemas/sheet'

/** What outline and register say before anybody looked: offered in the form, and marked until it is confirmed. */
export function answersFromRegister({ footprintM2, register }: Outline): SheetAnswers {
  const storeys = register.storeys === null ? null : Math.round(register.storeys * 2) / 2
  return {
    finding: { kind: 'standing' },
    footprint: { footprintM2, knownBy: 'register' },
    ...(register.use ? { use: { use: register.use, knownBy: 'register' } } : {}),
    ...(storeys ? { storeys: { aboveGround: storeys, knownBy: 'register' } } : {}),
    ...(register.year ? { constructionYear: { kind: 'exact', year: register.year, knownBy: 'register' } } : {}),
  }
}
