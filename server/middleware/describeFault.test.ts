import { DatabaseError } from 'sequelize'
import { describe, expect, it } from 'vitest'
import { describeFault } from './describeFault'

describe('what is logged of an error', () => {
  it('leaves out message, parameters and statement of a database error, which carry what people typed', () => {
    const original = Object.assign(new Error('duplicate key: (email)=(bo@ferrow.invalid)'), {
      code: '23505',
      detail: 'Key (email)=(bo@ferrow.invalid) already exists.',
      sql: 'INSERT INTO person',
    })

    const fault = describeFault(new DatabaseError(original))

    expect(fault).toMatchObject({ name: 'SequelizeDatabaseError', code: '23505' })
    expect(JSON.stringify(fault)).not.toMatch(/bo@ferrow|INSERT/)
    expect(describeFault(Object.assign(new Error('bo@ferrow.invalid'), { code: '23505' })).message).toBeUndefined()
  })

  it('keeps message and place of other errors, and takes anything that was thrown', () => {
    expect(describeFault(new TypeError('x is not a function'))).toMatchObject({
      name: 'TypeError',
      message: 'x is not a function',
      stack: expect.stringContaining('describeFault.test.ts'),
    })
    expect(describeFault('text')).toEqual({ name: 'string' })
  })
})
