import path from 'node:path'
import type { Verdict } from './judgeCheck'
import { judgeCheck } from './judgeCheck'
import { loadMethods } from './loadMethods'
import { readChecks } from './readChecks'

const OWN_CHECKS = path.join(import.meta.dirname, 'checks.json')

function line({ id, method, disagreements }: Verdict): string {
  const figures = disagreements.map(
    ({ key, got, expected }) => `${key}: got ${JSON.stringify(got)}, expected ${JSON.stringify(expected)}`,
  )
  return `${id} (${method}) ${figures.join('; ')}`
}

async function main(file: string): Promise<number> {
  const checks = readChecks(file)
  const others = [...checks, ...readChecks(OWN_CHECKS)]
  const register = await loadMethods()
  const verdicts = checks.map((check) => judgeCheck(check, others, register))
  const failed = verdicts.filter(({ disagreements }) => disagreements.length > 0)
  for (const verdict of failed) console.log(line(verdict))
  console.log(`${verdicts.length - failed.length} passed, ${failed.length} failed`)
  return failed.length === 0 ? 0 : 1
}

const file = process.argv[2] ?? OWN_CHECKS
main(file).then(
  (exitCode) => {
    process.exitCode = exitCode
  },
  (fault: unknown) => {
    console.error(`The checks could not be run: ${fault instanceof Error ? fault.message : String(fault)}`)
    process.exitCode = 1
  },
)
