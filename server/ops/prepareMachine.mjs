import { checkNode, hasNodePackages, hasTestSqlite, installNodePackages, installTestSqlite } from './nodePackages.mjs'
import { step } from './say.mjs'
import { installNeeds, missingNeeds } from './systemPackages.mjs'

/**
 * Makes the machine fit: packages of the system and of Node, where they are missing.
 *
 * @param {readonly ('database' | 'browser')[]} wanted
 * @param {{ forTests?: boolean, log?: (text: string) => void }} options
 */
export async function prepareMachine(wanted, { forTests = false, log } = {}) {
  checkNode()
  const mustCompile = forTests && !(hasNodePackages() && hasTestSqlite())
  const missing = missingNeeds([...wanted, ...(mustCompile ? ['compiler'] : [])])
  const work = []
  if (missing.length > 0) {
    work.push(step(`Installing packages of the system (${missing.join(', ')})`, () => installNeeds(missing, log)))
  }
  if (!hasNodePackages())
    work.push(step('Installing packages of Node (1 to 3 minutes)', () => installNodePackages(log)))
  const outcomes = await Promise.allSettled(work)
  for (const outcome of outcomes) if (outcome.status === 'rejected') throw outcome.reason
  if (forTests && !hasTestSqlite()) await step('Compiling SQLite for the tests', () => installTestSqlite(log))
}
