import { expect } from '@playwright/test'
import { signIn } from '@/tests/support/acts'
import { story } from '@/tests/support/story'

story(
  'a building is listed, its contractor reads the inventory and gives the tickets, the planner compares',
  async ({ appServer, browser }) => {
    const desk = await browser.newContext()
    const planner = await desk.newPage()
    await signIn(planner, appServer, 'planner')
    await planner.goto(`${appServer.url}/listed`)
    await planner.getByRole('button', { name: 'List a building' }).click()
    const dialog = planner.getByRole('dialog', { name: 'List a building' })
    await dialog.getByRole('textbox', { name: 'Find the building' }).fill('Street 1')
    const first = dialog.getByRole('radiogroup', { name: 'Building' }).getByRole('radio').last()
    const label = (await first.innerText()).split(' · ')[0] ?? ''
    await first.click()
    await dialog.getByRole('textbox', { name: 'Comes down on' }).fill('2027-03-01')
    await dialog.getByRole('checkbox', { name: new RegExp(appServer.account('contractor').name) }).click()
    await dialog.getByRole('button', { name: 'List it' }).click()
    await expect(planner.getByRole('heading', { name: label })).toBeVisible()
    await expect(planner.getByText('No ticket was given yet.', { exact: false })).toBeVisible()

    const yard = await browser.newContext()
    const contractor = await yard.newPage()
    await signIn(contractor, appServer, 'contractor')
    await contractor.getByRole('link', { name: 'Listed buildings' }).click()
    await contractor
      .getByRole('row', { name: `Open ${label}` })
      .or(contractor.getByRole('button', { name: `Open ${label}` }))
      .first()
      .click()
    await expect(contractor.getByRole('table', { name: 'Inventory' })).toBeVisible()
    const give = async (csv: string) => {
      const chooser = contractor.waitForEvent('filechooser')
      await contractor.getByRole('button', { name: 'Choose the file of tickets' }).click()
      await (await chooser).setFiles({ name: 'tickets.csv', mimeType: 'text/csv', buffer: Buffer.from(csv) })
    }
    await give('date,waste_code,mass_t\n2027-03-02,17 99 99,4\n')
    await expect(contractor.getByText('Row 2: "17 99 99" is no code of chapter 17', { exact: false })).toBeVisible()
    await give('date,waste_code,mass_t\n2027-03-02,17 01 02,12.5\n')
    await expect(contractor.getByText('The tickets are taken.')).toBeVisible()
    await contractor.getByRole('textbox', { name: 'What did you find?' }).fill('A well under the kitchen.')
    await contractor.getByRole('button', { name: 'Keep it' }).click()
    await expect(contractor.getByRole('list', { name: 'Found on site' })).toContainText('A well under the kitchen.')

    await planner.reload()
    await expect(planner.getByText('A well under the kitchen.')).toBeVisible()
    const bricks = planner
      .getByRole('table', { name: 'Weighed beside expected' })
      .getByRole('row')
      .filter({ hasText: '17 01 02' })
    await expect(bricks).toContainText('12.5')
    await desk.close()
    await yard.close()
  },
)
