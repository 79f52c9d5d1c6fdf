import { expect, type Page } from '@playwright/test'
import { signIn } from '@/tests/support/acts'
import { story } from '@/tests/support/story'

/** Draws a square over the middle of a map by tapping its corners. */
async function drawSquare(page: Page, mapName: string): Promise<void> {
  const map = page.getByLabel(mapName, { exact: true }).last()
  await expect(page.locator('[data-ready="true"]')).toBeVisible({ timeout: 30_000 })
  await page.getByRole('button', { name: 'Draw an area' }).click()
  const box = await map.boundingBox()
  if (!box) throw new Error('the map has no place on the page')
  const [left, right] = [box.x + box.width * 0.3, box.x + box.width * 0.75]
  // the bar of the drawing lies over the upper part
  const [top, bottom] = [box.y + box.height * 0.55, box.y + box.height * 0.85]
  for (const [x, y] of [
    [left, top],
    [right, top],
    [right, bottom],
    [left, bottom],
  ] as const) {
    await page.mouse.click(x, y)
  }
  await expect(page.getByText('4 corners set')).toBeVisible()
  await page.getByRole('button', { name: 'Done', exact: true }).click()
}

story('a planner draws a district, selects a beat by drawing, and shares the rest out', async ({ appServer, page }) => {
  await signIn(page, appServer, 'planner')
  await page.getByRole('link', { name: 'Rounds' }).click()
  await page.getByRole('button', { name: 'Draw a district' }).click()
  await page.getByRole('combobox', { name: 'Outlines of' }).selectOption('Upper Fold')
  await drawSquare(page, 'Outlines to draw around')
  const takes = page.getByText(/outlines of Upper Fold lie in it/)
  await expect(takes).toBeVisible()
  const count = Number((/\d+/.exec(await takes.innerText()) ?? [''])[0])
  expect(count).toBeGreaterThan(10)
  await page.getByRole('textbox', { name: 'Name of the district' }).fill('Fold terraces')
  await page.getByRole('button', { name: 'Make the district' }).click()
  await expect(page.getByText(new RegExp(`Fold terraces holds \\d+ outlines`))).toBeVisible()

  await page.getByRole('button', { name: 'New round' }).click()
  const dialog = page.getByRole('dialog', { name: 'New round' })
  await dialog.getByRole('textbox', { name: 'Name' }).fill('Terraces')
  await dialog.getByRole('combobox', { name: 'District' }).selectOption('Fold terraces')
  await dialog.getByRole('textbox', { name: 'Starts on' }).fill('2026-11-01')
  await dialog.getByRole('textbox', { name: 'Ends on' }).fill('2026-12-31')
  await dialog.getByRole('button', { name: 'Open the round' }).click()
  await expect(page.getByRole('heading', { name: 'Terraces' })).toBeVisible()
  await drawSquare(page, 'Buildings of the round by beat')
  await expect(page.getByText(/\d+ buildings selected/)).not.toHaveText('0 buildings selected')
  await page.getByRole('button', { name: 'Make a beat' }).click()
  await expect(page.getByText('Beat 1 is kept.')).toBeVisible()

  await page.getByRole('textbox', { name: 'Beats' }).fill('3')
  await page.getByRole('button', { name: 'Propose beats' }).click()
  const proposal = page.getByRole('table', { name: 'Proposed beats' })
  await expect(proposal.getByText('Beat 4')).toBeVisible()
  await page.getByRole('checkbox', { name: appServer.account('surveyor').name }).click()
  await page.getByRole('button', { name: 'Make these 3 beats' }).click()
  await expect(page.getByText('3 beats are made.')).toBeVisible()
  await expect(page.getByText('Share out what has no beat')).toBeHidden()
})
