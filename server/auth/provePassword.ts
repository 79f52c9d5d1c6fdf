import type { Request, Response } from 'express'
import { Passport } from 'passport'
import { Strategy as LocalStrategy } from 'passport-local'
import type { Context } from '@/server/context'
import type { ProvenPerson } from '@/server/commands/signIn'
import { Refusal } from '@/server/errors'
import { isPasswordRight } from './isPasswordRight'

interface SignInRow {
  organisation_id: string
  person_id: string
  password_hash: string | null
  status: string
}

/**
 * Makes the check of e-mail and password. Unknown, invited and disabled people, and wrong passwords, all take the
 * same time and get the same answer.
 */
export function provePassword({ database }: Pick<Context, 'database'>) {
  const passport = new Passport()
  passport.use(
    new LocalStrategy(
      { usernameField: 'email', passwordField: 'password', session: false },
      (email, password, done) => {
        findPerson(email.trim().toLowerCase(), password).then((person) => done(null, person ?? false), done)
      },
    ),
  )

  async function findPerson(email: string, password: string): Promise<ProvenPerson | undefined> {
    const [row] = await database.selectPublic<SignInRow>('SELECT * FROM sign_in_lookup($email)', { email })
    const isRight = await isPasswordRight(row?.password_hash, password)
    if (!row || !isRight || row.status !== 'active') return undefined
    return { organisationId: row.organisation_id, personId: row.person_id }
  }

  /** @throws {Refusal} `sign-in-refused` */
  return (request: Request, response: Response): Promise<ProvenPerson> =>
    new Promise((resolve, reject) => {
      const onVerdict = (error: unknown, person: ProvenPerson | false | null | undefined) => {
        if (error) return reject(error)
        if (!person) return reject(signInRefused())
        resolve(person)
      }
      passport.authenticate('local', { session: false }, onVerdict)(request, response, reject)
    })
}

const signInRefused = () =>
  new Refusal(
    401,
    'sign-in-refused',
    'E-mail address and password do not fit together. Nothing was changed; try again, or ask for a new password.',
  )
