import { expect, type Page } from '@playwright/test'
import { story } from '@/tests/support/story'

const SHOTS = process.env.FIELD_SHOTS

async function shot(page: Page, name: string): Promise<void> {
  if (SHOTS) await page.screenshot({ path: `${SHOTS}/${name}.png` })
}

story(
  'a sheet recorded without the server is kept over a closed browser and handed in',
  async ({ appServer, phone }) => {
    const surveyor = appServer.account('surveyor')
    const first = await phone.open()
    const page = await first.newPage()
    page.on('console', (message) => {
      if (message.type() === 'error') console.log('console:', message.text())
    })
    page.on('pageerror', (error) => console.log('page error:', error.message))
    await page.goto(appServer.url)
    await page.getByRole('textbox', { name: /e-mail/i }).fill(surveyor.email)
    await page.getByRole('textbox', { name: 'Password' }).fill(surveyor.password)
    await shot(page, '0-sign-in')
    await page.getByRole('button', { name: 'Sign in', exact: true }).click()
    await expect(page.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
    await page.evaluate(() => navigator.serviceWorker.ready)
    await shot(page, '1-today')

    await appServer.stop()
    await page.reload()
    await expect(page.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
    await page.getByRole('link', { name: 'Street' }).click()
    await expect(page.locator('[data-ready="true"]')).toBeVisible({ timeout: 30_000 })
    await shot(page, '2-street')
    await page.getByRole('button', { name: 'I have read this' }).click()
    await shot(page, '3-street-map')
    await page.getByRole('button', { name: 'Nearest unrecorded' }).click()
    await expect(page.getByText('How big')).toBeVisible()
    const label = await page.getByRole('banner').getByRole('heading').innerText()
    await page.getByRole('combobox', { name: 'Main use' }).selectOption('office')
    await page.getByRole('textbox', { name: 'Storeys above ground' }).fill('3')
    await page.getByRole('radio', { name: 'between' }).click()
    await page.getByRole('textbox', { name: 'Not before' }).fill('1895')
    await page.getByRole('textbox', { name: 'Not after' }).fill('1914')
    await page.getByRole('radio', { name: 'masonry, timber floors' }).click()
    await shot(page, '4-sheet')
    await page.getByRole('button', { name: 'Photo (0)' }).click()
    await page.getByRole('button', { name: 'Take it' }).click()
    await expect(page.getByRole('button', { name: 'Photo (1)' })).toBeVisible({ timeout: 20_000 })
    await expect(page.getByText(/kept \d/)).toBeVisible()
    await shot(page, '5-sheet-photo')
    await first.close()

    const second = await phone.open()
    const again = await second.newPage()
    await again.goto(`${appServer.url}/today`)
    await expect(again.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
    await again
      .getByRole('button', { name: `Open ${label}` })
      .first()
      .click()
    await expect(again.getByRole('textbox', { name: 'Not before' })).toHaveValue('1895')
    await again.getByRole('button', { name: 'Put in the bag' }).click()
    await expect(again.getByText(`${label} is in the bag.`)).toBeVisible()
    await again.getByRole('link', { name: /Bag/ }).click()
    await expect(again.getByText('kept here').first()).toBeVisible()
    await shot(again, '6-bag')

    await appServer.start()
    await again.getByRole('button', { name: 'Hand in' }).click()
    await expect(again.getByText('Nothing waits')).toBeVisible({ timeout: 30_000 })
    await shot(again, '7-bag-empty')
    await again.getByRole('link', { name: 'Me' }).click()
    await shot(again, '8-me')
    await second.close()
  },
)
