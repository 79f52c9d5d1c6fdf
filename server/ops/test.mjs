import { spawn } from 'node:child_process'
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { makeClosers } from './closers.mjs'
import { places, ROOT } from './places.mjs'
import { prepareMachine } from './prepareMachine.mjs'
import { endRunning } from './run.mjs'
import { say, step } from './say.mjs'
import { closingLine, countPlaywright, countVitest } from './suiteCounts.mjs'
import { startThrowAwayCluster } from './throwAwayCluster.mjs'

/** `npm test [-- SUITE …]`: everything that must hold, on a database that is thrown away. */
const bin = (name) => path.join(places.modules, '.bin', name)
const ONE_PASSED = { passed: 1, failed: 0, skipped: 0 }
const ONE_FAILED = { passed: 0, failed: 1, skipped: 0 }

const suites = {
  types: { title: 'Types', run: () => asOne(bin('tsc'), ['-p', 'tsconfig.json', '--noEmit']) },
  lint: { title: 'Lint', run: () => asOne(bin('eslint'), ['.', '--max-warnings', '0']) },
  unit: { title: 'Unit tests', run: () => vitest('unit') },
  server: { title: 'Server tests', needsDatabase: true, run: () => vitest('server') },
  components: { title: 'Component tests', run: () => vitest('components') },
  build: { title: 'Build', run: () => asOne(process.execPath, ['server/ops/build.mjs']) },
  e2e: { title: 'Stories in the browser', needsDatabase: true, needsBuild: true, run: playwright },
}

const closers = makeClosers()
const children = new Set()
const reports = mkdtempSync(path.join(os.tmpdir(), 'tallystone-reports-'))
closers.add(() => rmSync(reports, { recursive: true, force: true }))
closers.onSignal(() => {
  endRunning()
  for (const child of children) child.kill('SIGTERM')
  void closers.closeAll().then(() => process.exit(130))
})

try {
  const counts = await runAll(readArguments(process.argv.slice(2)))
  await closers.closeAll()
  summarise(counts)
} catch (error) {
  console.error(`\n${error.message}`)
  await closers.closeAll()
  console.log('0 passed, 1 failed')
  process.exitCode = 1
}

function readArguments(words) {
  const unknown = words.find((word) => !(word in suites))
  if (unknown !== undefined) throw new Error(`"${unknown}" is no suite. There are: ${Object.keys(suites).join(', ')}.`)
  return words.length > 0 ? words : Object.keys(suites)
}

async function runAll(names) {
  await prepareMachine(['database', ...(names.includes('e2e') ? ['browser'] : [])], { forTests: true })
  const environment = process.env
  if (names.some((name) => suites[name].needsDatabase) && !environment.TEST_DATABASE_ADMIN_URL) {
    const cluster = await step('Starting a database to throw away', () => startThrowAwayCluster())
    closers.add(cluster.stop)
    environment.TEST_DATABASE_ADMIN_URL = cluster.adminUrl
  }
  const counts = new Map()
  for (const name of names) {
    const { title, needsBuild, run } = suites[name]
    say(`\n== ${title} ==`)
    const hasBuild = !needsBuild || !names.includes('build') || counts.get('build')?.failed === 0
    if (!hasBuild) say('Not run: the build failed.')
    counts.set(name, hasBuild ? await run() : ONE_FAILED)
  }
  return counts
}

function summarise(counts) {
  say('\n== Summary ==')
  for (const [name, count] of counts) say(`${suites[name].title}: ${closingLine([count])}`)
  const all = [...counts.values()]
  if (all.some((count) => count.failed > 0)) process.exitCode = 1
  console.log(closingLine(all))
}

async function asOne(program, args) {
  return (await runShown(program, args)) === 0 ? ONE_PASSED : ONE_FAILED
}

async function vitest(project) {
  const report = path.join(reports, `${project}.json`)
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`]
  const exitCode = await runShown(bin('vitest'), ['run', '--project', project, '--passWithNoTests', ...reporters])
  return counted(report, countVitest, exitCode)
}

async function playwright() {
  const report = path.join(reports, 'e2e.json')
  const exitCode = await runShown(bin('playwright'), ['test', '--reporter=list,json'], {
    PLAYWRIGHT_JSON_OUTPUT_NAME: report,
  })
  return counted(report, countPlaywright, exitCode)
}

/** A runner that ended badly has failed, whatever its report says. */
function counted(report, count, exitCode) {
  if (!existsSync(report)) return exitCode === 0 ? { ...ONE_PASSED, passed: 0 } : ONE_FAILED
  const counts = count(JSON.parse(readFileSync(report, 'utf8')))
  return exitCode !== 0 && counts.failed === 0 ? { ...counts, failed: 1 } : counts
}

function runShown(program, args, env = {}) {
  return new Promise((resolve) => {
    const child = spawn(program, args, {
      cwd: ROOT,
      env: { ...process.env, VITE_CONFIG_NATIVE_IGNORE_WARNING: 'true', ...env },
      stdio: ['ignore', 'inherit', 'inherit'],
    })
    children.add(child)
    child.once('error', () => resolve(1))
    child.once('close', (code) => {
      children.delete(child)
      resolve(code ?? 1)
    })
  })
}
