import path from 'node:path'
import { parseArgs } from 'node:util'
import { z } from 'zod'
import { email, typedText } from '@/shared/schemas/primitives'
import { describeFault } from './middleware/describeFault'
import { migrate } from './migrate'
import { inviteFirstSteward } from './setup/inviteFirstSteward'
import { isDatabaseEmpty } from './setup/isDatabaseEmpty'

const USAGE = `Commands (DATABASE_OWNER_URL names the database, as the owner of its tables):
  migrate         bring the tables up to date
  is-empty        whether no organisation is there yet
  first-steward   make the first organisation and print the link of its steward
                  [--organisation NAME] [--name NAME] [--email ADDRESS]
  seed-demo       load the invented town if the database is empty; prints its accounts
  demo-accounts   print the accounts of the invented town
The last line of the output is the answer as JSON.`

/** A command that cannot be run as it was given; the message says why and what to do. */
class CommandLineError extends Error {}

const settings = z.object({
  DATABASE_OWNER_URL: z.string().startsWith('postgres'),
  PORT: z.string().regex(/^\d+$/).default('8080'),
  PUBLIC_URL: z.url().optional(),
  PHOTO_ROOT: z.string().default('.local/photos'),
})
type Settings = z.infer<typeof settings>

const commands: Readonly<Record<string, (settings: Settings, words: string[]) => Promise<unknown>>> = {
  migrate: async ({ DATABASE_OWNER_URL }) => ({ steps: await migrate(DATABASE_OWNER_URL) }),
  'is-empty': async ({ DATABASE_OWNER_URL }) => ({ isEmpty: await isDatabaseEmpty(DATABASE_OWNER_URL) }),
  'first-steward': firstSteward,
  'seed-demo': seedDemoIfEmpty,
  'demo-accounts': async () => ({ accounts: (await loadDemo()).demoAccounts() }),
}

async function firstSteward({ DATABASE_OWNER_URL, PUBLIC_URL, PORT }: Settings, words: string[]): Promise<unknown> {
  const { values } = parseArgs({
    args: words,
    options: { organisation: { type: 'string' }, name: { type: 'string' }, email: { type: 'string' } },
  })
  const first = z
    .object({ organisation: typedText(120).min(1), name: typedText(120).min(1), email })
    .safeParse({ organisation: 'My organisation', name: 'Steward', email: 'steward@tallystone.invalid', ...values })
  if (!first.success) {
    throw new CommandLineError(
      first.error.issues.map((issue) => `--${issue.path.join('.')}: ${issue.message}`).join('\n'),
    )
  }
  const publicUrl = (PUBLIC_URL ?? `http://127.0.0.1:${PORT}`).replace(/\/$/, '')
  const { organisation: organisationName, ...person } = first.data
  return (await inviteFirstSteward(DATABASE_OWNER_URL, publicUrl, { organisationName, ...person }, new Date())) ?? {}
}

async function seedDemoIfEmpty({ DATABASE_OWNER_URL, PHOTO_ROOT }: Settings): Promise<unknown> {
  const demo = await loadDemo()
  if (await isDatabaseEmpty(DATABASE_OWNER_URL)) {
    return { accounts: await demo.seedDemo(DATABASE_OWNER_URL, path.resolve(PHOTO_ROOT)), isNew: true }
  }
  return { accounts: (await demo.isDemoThere(DATABASE_OWNER_URL)) ? demo.demoAccounts() : [], isNew: false }
}

/** Loaded only when asked for: a server that serves real organisations never reads the invented town. */
async function loadDemo() {
  const [{ seedDemo, demoAccounts }, { isDemoThere }] = await Promise.all([
    import('./demo/seedDemo'),
    import('./setup/isDemoThere'),
  ])
  return { seedDemo, demoAccounts, isDemoThere }
}

async function main(): Promise<void> {
  const [name = '', ...words] = process.argv.slice(2)
  const command = commands[name]
  if (!command) throw new CommandLineError(`"${name}" is not a command.\n${USAGE}`)
  const parsed = settings.safeParse(process.env)
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join('.')}: ${issue.message}`)
    throw new CommandLineError(`These settings cannot be used:\n${lines.join('\n')}\nNothing was changed.`)
  }
  process.stdout.write(`${JSON.stringify(await command(parsed.data, words))}\n`)
}

main().catch((error: unknown) => {
  const fault = describeFault(error)
  const words = error instanceof CommandLineError ? error.message : `${fault.message ?? fault.name} ${fault.code ?? ''}`
  process.stderr.write(`${words.trim()}\n`)
  process.exitCode = 1
})
