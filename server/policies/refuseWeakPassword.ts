import { isCommonPassword } from '@/server/auth/isCommonPassword'
import { unusable } from '@/server/errors'

/** @throws {Refusal} `input-not-usable` when the password is one of the first that anybody would try, or the address */
export function refuseWeakPassword(password: string, email: string): void {
  if (!isCommonPassword(password) && password.toLowerCase() !== email.toLowerCase()) return
  throw unusable('This password is one of the first that would be tried. Nothing was changed; choose another.', [
    {
      pointer: '/body/password',
      code: 'password-too-common',
      detail: 'choose a longer password, such as four words that do not belong together',
    },
  ])
}
