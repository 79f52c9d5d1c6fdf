import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'
import type { AppServer } from '@/tests/support/appServer'
import { story } from '@/tests/support/story'

async function signIn(page: Page, server: AppServer): Promise<void> {
  const surveyor = server.account('surveyor')
  await page.goto(server.url)
  await page.getByRole('textbox', { name: 'E-mail' }).fill(surveyor.email)
  await page.getByRole('textbox', { name: 'Password' }).fill(surveyor.password)
  await page.getByRole('button', { name: 'Sign in', exact: true }).click()
  await expect(page.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
}

async function faultsOf(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).analyze()
  return violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)
}

for (const look of ['limewash', 'night'] as const) {
  story(`the screens of the field can be used by everybody, ${look}`, async ({ sharedServer, page }) => {
    await page.addInitScript((chosen) => {
      localStorage.setItem('tallystone.look', JSON.stringify({ look: chosen, isBrightSun: false }))
    }, look)
    await signIn(page, sharedServer)
    expect(await faultsOf(page)).toEqual([])

    await page.getByRole('link', { name: 'Street' }).click()
    await expect(page.locator('[data-ready="true"]')).toBeVisible({ timeout: 30_000 })
    expect(await faultsOf(page)).toEqual([])
    await page.getByRole('radio', { name: 'List' }).click()
    await page.getByRole('textbox', { name: 'Street or reference' }).fill('1')
    expect(await faultsOf(page)).toEqual([])

    await page.getByRole('button', { name: 'Nearest unrecorded' }).click()
    await expect(page.getByText('How big')).toBeVisible()
    await page.getByRole('radio', { name: 'not known' }).first().click()
    await page.getByRole('button', { name: 'Put in the bag' }).click()
    await expect(page.getByText(/Before it can go in the bag/)).toBeVisible()
    expect(await faultsOf(page)).toEqual([])

    for (const place of ['Bag', 'Me']) {
      await page.getByRole('link', { name: place }).click()
      await expect(page.getByRole('heading', { name: place, exact: true })).toBeVisible()
      expect(await faultsOf(page)).toEqual([])
    }
  })
}

story('one tab owns what is kept, and another takes it over', async ({ sharedServer, page, context }) => {
  await signIn(page, sharedServer)
  const other = await context.newPage()
  await other.goto(`${sharedServer.url}/today`)
  await expect(other.getByText('The field is open in another tab or window.')).toBeVisible({ timeout: 30_000 })

  await other.getByRole('button', { name: 'Use here' }).click()

  await expect(other.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
  await expect(page.getByText('The field is open in another tab or window.')).toBeVisible()
})
