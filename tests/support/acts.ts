import { expect, type Page } from '@playwright/test'
import type { AppServer } from './appServer'

/** Signs in the demo's account of a role, by the screen. */
export async function signIn(page: Page, server: AppServer, role: string): Promise<void> {
  const account = server.account(role)
  await page.goto(server.url)
  await page.getByRole('textbox', { name: 'E-mail' }).fill(account.email)
  await page.getByRole('textbox', { name: 'Password' }).fill(account.password)
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  await expect(page.getByRole('textbox', { name: 'Password' })).toBeHidden({ timeout: 30_000 })
}

/** What a surveyor answers in {@link recordNearest}. */
export interface Answers {
  readonly use: string
  readonly structure: string
  readonly storeys: number
  /** Chosen first where the surveyor has several beats. */
  readonly beat?: string
}

/**
 * Records the nearest building that has no sheet yet, with a photo, and puts it in the bag.
 *
 * @returns what the building is called on its sheet
 */
export async function recordNearest(page: Page, { use, structure, storeys, beat }: Answers): Promise<string> {
  await page.getByRole('link', { name: 'Street' }).click()
  const caution = page.getByRole('button', { name: 'I have read this' })
  await expect(page.getByRole('button', { name: 'Nearest unrecorded' }).or(caution).first()).toBeVisible()
  if (await caution.isVisible()) await caution.click()
  if (beat !== undefined) await page.getByRole('radio', { name: beat }).click()
  await page.getByRole('button', { name: 'Nearest unrecorded' }).click()
  await expect(page.getByText('How big')).toBeVisible()
  const label = await page.getByRole('banner').getByRole('heading').innerText()
  await page.getByRole('combobox', { name: 'Main use' }).selectOption(use)
  await page.getByRole('textbox', { name: 'Storeys above ground' }).fill(String(storeys))
  await page.getByRole('radio', { name: 'between' }).click()
  await page.getByRole('textbox', { name: 'Not before' }).fill('1895')
  await page.getByRole('textbox', { name: 'Not after' }).fill('1914')
  await page.getByRole('radio', { name: structure }).click()
  await page.getByRole('button', { name: 'Photo (0)' }).click()
  await page.getByRole('button', { name: 'Take it' }).click()
  await expect(page.getByRole('button', { name: 'Photo (1)' })).toBeVisible({ timeout: 20_000 })
  await page.getByRole('button', { name: 'Put in the bag' }).click()
  await expect(page.getByText(`${label} is in the bag.`)).toBeVisible()
  return label
}

/** Accepts each of these sheets on the planner's *Review*. */
export async function acceptSheets(page: Page, labels: readonly string[]): Promise<void> {
  await page.getByRole('link', { name: /Review/ }).click()
  for (const label of labels) {
    await page
      .getByRole('button', { name: `Open ${label}` })
      .or(page.getByRole('row', { name: `Open ${label}` }))
      .first()
      .click()
    await expect(page.getByRole('heading', { name: label })).toBeVisible()
    await page.getByRole('button', { name: 'Accept (A)' }).click()
    // accepting goes on to the next sheet by itself
    await expect(page.getByRole('heading', { name: label })).toBeHidden()
    await page.getByRole('link', { name: /Review/ }).click()
  }
}

/** Computes a run of a round on *Stock*. @returns its number as the page names it */
export async function computeRun(page: Page, roundLabel: RegExp): Promise<string> {
  await page.getByRole('link', { name: 'Stock' }).click()
  await page.getByRole('button', { name: 'New run' }).first().click()
  const dialog = page.getByRole('dialog', { name: 'Compute a new run' })
  const round = dialog.getByRole('combobox', { name: 'Round' })
  const label = await round.getByRole('option').filter({ hasText: roundLabel }).first().innerText()
  await round.selectOption({ label })
  await dialog.getByRole('button', { name: 'Compute' }).click()
  const done = page.getByText(/Run \d+ is done\./)
  await expect(done).toBeVisible({ timeout: 120_000 })
  await expect(dialog).toBeHidden()
  return (/\d+/.exec(await done.innerText()) ?? [''])[0]
}

/** Publishes a run to the contractor of this name. */
export async function publishRun(page: Page, runNumber: string, title: string, contractor: string): Promise<void> {
  await page.getByRole('link', { name: 'Publish' }).click()
  await page.getByRole('button', { name: 'Publish a run' }).click()
  const dialog = page.getByRole('dialog', { name: 'Publish a run' })
  const run = dialog.getByRole('combobox', { name: 'Run' })
  const label = await run
    .getByRole('option')
    .filter({ hasText: new RegExp(`^Run ${runNumber} `) })
    .innerText()
  await run.selectOption({ label })
  await dialog.getByRole('textbox', { name: 'Title' }).fill(title)
  await dialog.getByRole('checkbox', { name: new RegExp(contractor) }).click()
  await dialog.getByRole('button', { name: 'Publish', exact: true }).click()
  await expect(page.getByText(`Published: ${title}`)).toBeVisible()
}
