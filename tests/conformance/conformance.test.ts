import path from 'node:path'
import { expect, it } from 'vitest'
import { judgeCheck } from './judgeCheck'
import { loadMethods } from './loadMethods'
import { readChecks } from './readChecks'

const checks = readChecks(path.join(import.meta.dirname, 'checks.json'))
const register = await loadMethods()

it.each(checks.map((check) => [check.id, check] as const))('%s agrees with its reference', (_id, check) => {
  const { disagreements } = judgeCheck(check, checks, register)

  expect(disagreements).toEqual([])
})
