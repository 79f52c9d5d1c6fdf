import { createMessages } from '@/shared/messages/createMessages'
import type { FactorFault } from '@/shared/factorBook/judgeFactorRow'

const { t } = createMessages('en')

/** A fault in words, as the screens say it. */
export function factorFaultText({ code, parts }: FactorFault): string {
  return t(`factorBook.fault.${code}`, parts)
}
