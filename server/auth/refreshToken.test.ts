import { randomBytes, randomUUID } from 'node:crypto'
import { describe, expect, it } from 'vitest'
import { isCommonPassword } from './isCommonPassword'
import { childOf, readRefreshToken, writeRefreshToken } from './refreshToken'

const SECRET = 'only-for-tests-0123456789abcdef0123456789abcdef'
const token = () => ({ organisationId: randomUUID(), sessionId: randomUUID(), generation: 7, secret: randomBytes(32) })

describe('a refresh token', () => {
  it('is read as it was written', () => {
    const written = token()
    expect(readRefreshToken(writeRefreshToken(written, SECRET), SECRET)).toEqual(written)
  })

  it('means nothing when any byte is changed, or another server wrote it', () => {
    const bytes = Buffer.from(writeRefreshToken(token(), SECRET), 'base64url')
    for (let index = 0; index < bytes.length; index += 1) {
      const changed = Buffer.from(bytes)
      changed[index] = (changed[index] ?? 0) ^ 1
      expect(readRefreshToken(changed.toString('base64url'), SECRET)).toBeUndefined()
    }
    expect(readRefreshToken(bytes.toString('base64url'), `${SECRET}x`)).toBeUndefined()
    expect(readRefreshToken('', SECRET)).toBeUndefined()
  })

  it('has one child a rotation, and another for another rotation, generation or session', () => {
    const parent = token()
    const [one, other] = [randomBytes(16).toString('hex'), randomBytes(16).toString('hex')]

    const child = childOf(parent, one, SECRET)

    expect(child.generation).toBe(8)
    expect(childOf(parent, one, SECRET)).toEqual(child)
    expect(childOf(parent, other, SECRET).secret).not.toEqual(child.secret)
    expect(childOf({ ...parent, generation: 8 }, one, SECRET).secret).not.toEqual(child.secret)
    expect(childOf({ ...parent, sessionId: randomUUID() }, one, SECRET).secret).not.toEqual(child.secret)
  })
})

describe('common passwords', () => {
  it.each(['password', 'Password1', 'qwertyuiop', '12345678', 'zzzzzzzzzz', 'Tallystone1'])(
    'count %s in',
    (password) => {
      expect(isCommonPassword(password)).toBe(true)
    },
  )

  it('leave a sentence of four words out', () => {
    expect(isCommonPassword('rope walk kiln upper fold')).toBe(false)
  })
})
