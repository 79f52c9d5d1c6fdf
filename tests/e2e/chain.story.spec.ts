import { expect, type Page } from '@playwright/test'
import { acceptSheets, computeRun, publishRun, recordNearest, signIn, type Answers } from '@/tests/support/acts'
import type { AppServer } from '@/tests/support/appServer'
import { makeDevice, type Device } from '@/tests/support/browser'
import { story } from '@/tests/support/story'

const MASONRY: Answers = { use: 'office', structure: 'masonry, timber floors', storeys: 3 }

/** One day in the street without the server: three sheets with photos, over a closed browser, then handed in. */
async function walkWithoutServer(server: AppServer, phone: Device, answers: Answers): Promise<string[]> {
  const first = await phone.open()
  const street = await first.newPage()
  await signIn(street, server, 'surveyor')
  await expect(street.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
  await street.evaluate(() => navigator.serviceWorker.ready)

  await server.stop()
  await street.reload()
  await expect(street.getByText('Your beat')).toBeVisible({ timeout: 30_000 })
  const labels = [
    await recordNearest(street, answers),
    await recordNearest(street, { ...answers, storeys: 2 }),
    await recordNearest(street, { ...answers, storeys: 4 }),
  ]
  expect(new Set(labels).size).toBe(3)
  await first.close()

  const second = await phone.open()
  const bag = await second.newPage()
  await bag.goto(`${server.url}/bag`)
  await expect(bag.getByText('kept here').first()).toBeVisible({ timeout: 30_000 })
  await server.start()
  await bag.getByRole('button', { name: 'Hand in' }).click()
  await expect(bag.getByText('Nothing waits')).toBeVisible({ timeout: 60_000 })
  await second.close()
  return labels
}

/** The contractor opens what was published and reads tonnes by waste code. */
async function readLoads(page: Page, server: AppServer, title: string): Promise<void> {
  await signIn(page, server, 'contractor')
  await page
    .getByRole('button', { name: `Open “${title}”` })
    .or(page.getByRole('row', { name: `Open “${title}”` }))
    .first()
    .click()
  await expect(page.getByRole('heading', { name: title })).toBeVisible()
  const bricks = page.getByRole('row').filter({ hasText: '17 01 02' }).first()
  await expect(bricks).toBeVisible()
  await expect(bricks).toContainText(/\d/)
}

story(
  'a sheet goes from a street without network to a contractor who reads the loads',
  async ({ appServer, phone }) => {
    story.setTimeout(420_000)
    const labels = await walkWithoutServer(appServer, phone, MASONRY)

    const desk = makeDevice('desk')
    const planning = await desk.open()
    const planner = await planning.newPage()
    await signIn(planner, appServer, 'planner')
    await acceptSheets(planner, labels)
    const runNumber = await computeRun(planner, /Ropewalk/)
    await publishRun(planner, runNumber, 'Ropewalk after the walk', appServer.account('contractor').name)
    await planning.close()

    const yard = makeDevice('desk')
    const reading = await yard.open()
    await readLoads(await reading.newPage(), appServer, 'Ropewalk after the walk')
    await reading.close()
    desk.discard()
    yard.discard()
  },
)

story('160 real outlines go through the screens, from the file to the loads', async ({ appServer, phone }) => {
  story.setTimeout(420_000)
  const desk = makeDevice('desk')
  const planning = await desk.open()
  const planner = await planning.newPage()
  await signIn(planner, appServer, 'planner')
  await importRealOutlines(planner)
  await shareOut(planner, appServer.account('surveyor').name)

  const labels = await walkWithoutServer(appServer, phone, { ...MASONRY, beat: 'Along the canal' })

  await acceptSheets(planner, labels)
  const runNumber = await computeRun(planner, /First look/)
  await publishRun(planner, runNumber, 'First look at the canal side', appServer.account('contractor').name)
  await planning.close()

  const yard = makeDevice('phone')
  const reading = await yard.open()
  await readLoads(await reading.newPage(), appServer, 'First look at the canal side')
  await reading.close()
  desk.discard()
  yard.discard()
})

async function importRealOutlines(planner: Page): Promise<void> {
  await planner.getByRole('link', { name: 'Rounds' }).click()
  await planner.getByRole('button', { name: 'Import outlines' }).click()
  const chooser = planner.waitForEvent('filechooser')
  await planner.getByRole('button', { name: 'Choose a file of outlines' }).click()
  await (await chooser).setFiles('tests/fixtures/outlines-real.geojson')
  await expect(planner.getByText('160 of 160 usable')).toBeVisible({ timeout: 30_000 })
  await expect(planner.getByRole('combobox', { name: 'Height in metres' })).toHaveValue('measuredHeight')
  await planner.getByRole('textbox', { name: 'Name of the district' }).fill('Canal side')
  await planner.getByRole('button', { name: 'Import 160 outlines' }).click()
  await expect(planner.getByText(/160 outlines are in the district/)).toBeVisible({ timeout: 30_000 })
  await planner.getByRole('button', { name: 'To the rounds' }).click()
}

async function shareOut(planner: Page, surveyor: string): Promise<void> {
  await planner.getByRole('button', { name: 'New round' }).click()
  const dialog = planner.getByRole('dialog', { name: 'New round' })
  await dialog.getByRole('textbox', { name: 'Name' }).fill('First look')
  await dialog.getByRole('combobox', { name: 'District' }).selectOption('Canal side')
  await dialog.getByRole('textbox', { name: 'Starts on' }).fill('2026-11-01')
  await dialog.getByRole('textbox', { name: 'Ends on' }).fill('2026-12-31')
  await dialog.getByRole('button', { name: 'Open the round' }).click()
  await expect(planner.getByRole('heading', { name: 'First look' })).toBeVisible()
  await planner.getByRole('button', { name: 'Select all without a beat' }).click()
  await planner.getByRole('textbox', { name: 'Beat', exact: true }).fill('Along the canal')
  await planner.getByRole('combobox', { name: 'Surveyor' }).selectOption(surveyor)
  await planner.getByRole('button', { name: 'Make a beat' }).click()
  await expect(planner.getByText(/is kept\./)).toBeVisible()
}
