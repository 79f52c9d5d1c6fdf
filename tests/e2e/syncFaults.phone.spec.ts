import { appendFileSync, cpSync, mkdtempSync, rmSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { expect, type BrowserContext, type Page } from '@playwright/test'
import { openDatabase } from '@/server/database'
import { signIn } from '@/tests/support/acts'
import { startAppServer, type AppServer } from '@/tests/support/appServer'
import { story } from '@/tests/support/story'

/** Opens the field with everything it needs to work without a server. */
async function openField(context: BrowserContext, server: AppServer): Promise<Page> {
  const page = await context.newPage()
  await signIn(page, server, 'surveyor')
  await expect(page.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
  await page.evaluate(() => navigator.serviceWorker.ready)
  await page.getByRole('link', { name: 'Street' }).click()
  await page.getByRole('button', { name: 'I have read this' }).click()
  await page.getByRole('link', { name: 'Today' }).click()
  return page
}

/** Fills in the nearest building without a sheet. @returns what it is called */
async function beginNearest(page: Page, storeys: number): Promise<string> {
  await page.getByRole('link', { name: 'Street' }).click()
  await page.getByRole('button', { name: 'Nearest unrecorded' }).click()
  await expect(page.getByText('How big')).toBeVisible({ timeout: 30_000 })
  const label = await page.getByRole('banner').getByRole('heading').innerText()
  await page.getByRole('combobox', { name: 'Main use' }).selectOption('office')
  await page.getByRole('textbox', { name: 'Storeys above ground' }).fill(String(storeys))
  await page.getByRole('radio', { name: 'between' }).click()
  await page.getByRole('textbox', { name: 'Not before' }).fill('1895')
  await page.getByRole('textbox', { name: 'Not after' }).fill('1914')
  await page.getByRole('radio', { name: 'masonry, timber floors' }).click()
  await expect(page.getByText(/kept \d/)).toBeVisible()
  return label
}

async function putInBag(page: Page, label: string): Promise<void> {
  await page.getByRole('button', { name: 'Put in the bag' }).click()
  await expect(page.getByText(`${label} is in the bag.`)).toBeVisible()
}

async function handInAll(page: Page): Promise<void> {
  await page.getByRole('link', { name: /Bag/ }).click()
  await expect(async () => {
    const button = page.getByRole('button', { name: 'Hand in' })
    if (await button.isEnabled()) await button.click()
    await expect(page.getByText('Nothing waits')).toBeVisible({ timeout: 5_000 })
  }).toPass({ timeout: 60_000 })
}

/** What the server took of devices that handed in since the demo was made, in the order of their numbers. */
async function appliedOf(server: AppServer) {
  const database = openDatabase(server.ownerUrl, { poolSize: 1 })
  try {
    return await database.selectPublic<{ seq: string; outcome: string; storeys: number | null; sheet_id: string }>(
      `SELECT a.seq, a.outcome, s.sheet_id, (s.answers -> 'storeys' ->> 'aboveGround')::float AS storeys
       FROM applied_mutation a JOIN sheet s ON s.organisation_id = a.organisation_id
         AND (s.versions ->> 'storeys')::bigint = a.change_no
       ORDER BY a.device_id, a.seq`,
    )
  } finally {
    await database.close()
  }
}

/** Every sheet that was called saved is on the server once, with numbers that have no gap, and nothing beside. */
async function assertNothingLost(server: AppServer, storeys: readonly number[]): Promise<void> {
  const applied = await appliedOf(server)
  expect(applied.map((row) => row.storeys).sort((one, other) => Number(one) - Number(other))).toEqual(
    [...storeys].sort((one, other) => one - other),
  )
  expect(applied.map(({ seq }) => Number(seq))).toEqual(storeys.map((_, index) => index + 1))
}

story(
  'F1 a page that is killed in the middle of a save has the sheet or the draft, never half',
  async ({ appServer, phone }) => {
    story.setTimeout(240_000)
    const context = await phone.open()
    let page = await openField(context, appServer)
    await appServer.stop()
    const saved: number[] = []
    for (const [round, delayMs] of [0, 5, 12, 25, 50].entries()) {
      const storeys = 11 + round
      const label = await beginNearest(page, storeys)
      void page
        .getByRole('button', { name: 'Put in the bag' })
        .click({ noWaitAfter: true })
        .catch(() => undefined)
      await new Promise((resolve) => setTimeout(resolve, delayMs))
      await page.close({ runBeforeUnload: false })
      page = await context.newPage()
      await page.goto(`${appServer.url}/bag`)
      await expect(page.getByText('What waits')).toBeVisible({ timeout: 30_000 })
      const isInBag = await page.getByText(label).first().isVisible()
      if (!isInBag) {
        await page.getByRole('link', { name: 'Today' }).click()
        await page
          .getByRole('button', { name: `Open ${label}` })
          .first()
          .click()
        await expect(page.getByRole('textbox', { name: 'Storeys above ground' })).toHaveValue(String(storeys))
        await expect(page.getByRole('textbox', { name: 'Not before' })).toHaveValue('1895')
        await putInBag(page, label)
      }
      saved.push(storeys)
    }
    await appServer.start()
    await handInAll(page)
    await assertNothingLost(appServer, saved)
    await context.close()
  },
)

story(
  'F15 a database that is gone comes back from its second copy, with everything in the bag',
  async ({ appServer, phone }) => {
    const context = await phone.open()
    let page = await openField(context, appServer)
    await appServer.stop()
    for (const storeys of [7, 8]) await putInBag(page, await beginNearest(page, storeys))
    await page.close()
    const beside = await context.newPage()
    await beside.goto(`${appServer.url}/favicon.svg`).catch(() => undefined)
    await appServer.start()
    await beside.goto(`${appServer.url}/robots.txt`)
    const removed = await beside.evaluate(async () => {
      const folder = await navigator.storage.getDirectory()
      const names: string[] = []
      for await (const name of (folder as unknown as { keys(): AsyncIterable<string> }).keys()) names.push(name)
      for (const name of names) await folder.removeEntry(name, { recursive: true })
      return names.length
    })
    expect(removed).toBeGreaterThan(0)
    await appServer.stop()
    await beside.close()

    page = await context.newPage()
    await page.goto(`${appServer.url}/bag`)
    await expect(page.getByText('2 sheets').first()).toBeVisible({ timeout: 30_000 })
    await appServer.start()
    await handInAll(page)
    await assertNothingLost(appServer, [7, 8])
    await context.close()
  },
)

story(
  'F2 F7 a server that is gone after it took the bag, before it answered, takes it once',
  async ({ appServer, phone }) => {
    const context = await phone.open()
    const page = await openField(context, appServer)
    let isCut = false
    await context.route('**/api/v1/sync/push', async (route) => {
      if (isCut) return route.continue()
      isCut = true
      const answer = await route.fetch()
      expect(answer.status()).toBe(200)
      await appServer.stop()
      await route.abort('connectionreset')
    })
    await putInBag(page, await beginNearest(page, 9))
    await page.getByRole('link', { name: /Bag/ }).click()
    await page.getByRole('button', { name: 'Hand in' }).click()
    await expect(page.getByText('The server was not reached.')).toBeVisible({ timeout: 30_000 })
    await expect(page.getByText('kept here').first()).toBeVisible()
    await appServer.start()
    await handInAll(page)
    await assertNothingLost(appServer, [9])
    await context.close()
  },
)

story(
  'F13 a sheet is saved on the space held back when the disk is full, or the form says that it is not',
  async ({ appServer, phone }) => {
    const context = await phone.open()
    const page = await openField(context, appServer)
    await appServer.stop()
    const label = await beginNearest(page, 6)
    const session = await context.newCDPSession(page)
    const origin = new URL(appServer.url).origin
    const { usage } = await session.send('Storage.getUsageAndQuota', { origin })
    await session.send('Storage.overrideQuotaForOrigin', { origin, quotaSize: Math.max(1, Math.floor(usage * 0.5)) })
    await page.getByRole('button', { name: 'Put in the bag' }).click()
    const isSaved = page.getByText(`${label} is in the bag.`)
    const isRefused = page.getByRole('alert')
    await expect(isSaved.or(isRefused).first()).toBeVisible({ timeout: 30_000 })
    if (!(await isSaved.isVisible())) {
      await expect(page.getByRole('textbox', { name: 'Storeys above ground' })).toHaveValue('6')
    }
    await session.send('Storage.overrideQuotaForOrigin', { origin })
    if (!(await isSaved.isVisible())) await putInBag(page, label)
    await appServer.start()
    await handInAll(page)
    await assertNothingLost(appServer, [6])
    await context.close()
  },
)

story('F25 a newer app waits while a form is open, and takes over without a typed answer lost', async ({ phone }) => {
  const webRoot = mkdtempSync(path.join(os.tmpdir(), 'tallystone-web-'))
  cpSync(path.join(process.cwd(), '.build', 'web'), webRoot, { recursive: true })
  for (const ending of ['br', 'gz']) rmSync(path.join(webRoot, `service-worker.js.${ending}`), { force: true })
  const server = await startAppServer('demo', { webRoot })
  try {
    const context = await phone.open()
    const page = await openField(context, server)
    const label = await beginNearest(page, 5)
    appendFileSync(path.join(webRoot, 'service-worker.js'), '\n// a newer one\n')
    await page.evaluate(async () => (await navigator.serviceWorker.getRegistration())?.update())
    const takeOver = page
      .getByRole('button', { name: 'Change over now' })
      .or(page.getByRole('button', { name: /update/i }))
    await expect(takeOver.first()).toBeVisible({ timeout: 30_000 })
    await expect(page.getByRole('textbox', { name: 'Storeys above ground' })).toHaveValue('5')
    await takeOver.first().click()
    await expect(page.getByRole('textbox', { name: 'Storeys above ground' })).toHaveValue('5', { timeout: 30_000 })
    await putInBag(page, label)
    await handInAll(page)
    await assertNothingLost(server, [5])
    await context.close()
  } finally {
    await server.close()
    rmSync(webRoot, { recursive: true, force: true })
  }
})
