import { mkdirSync } from 'node:fs'
import path from 'node:path'
import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'
import { sideEntries } from '@/components/session/sideEntries'
import type { Role } from '@/shared/schemas/person'
import { signIn } from '@/tests/support/acts'
import { story } from '@/tests/support/story'

/** Where pictures of each screen go when somebody wants to look at them. */
const SHOTS = process.env.SCREEN_SHOTS

/** Screens that are reached from a list: the list, and what opens the first of it. */
const NESTED: readonly { readonly role: Role; readonly from: string; readonly open: RegExp }[] = [
  { role: 'planner', from: '/rounds', open: /^Open / },
  { role: 'planner', from: '/rounds', open: /^Import outlines$/ },
  { role: 'planner', from: '/review', open: /^Open / },
  { role: 'contractor', from: '/loads-ahead', open: /^Open / },
]

async function isAtRest(page: Page): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible({ timeout: 30_000 })
  await expect(page.getByText(/^(Loading|Reading the run) …$/)).toHaveCount(0, { timeout: 30_000 })
  await expect(page.locator('[data-ready="false"]')).toHaveCount(0, { timeout: 30_000 })
}

/** The faults of a screen, told by its address; takes its picture on the way. */
async function look(page: Page, name: string): Promise<string[]> {
  await isAtRest(page)
  if (SHOTS !== undefined) {
    mkdirSync(SHOTS, { recursive: true })
    await page.screenshot({ path: path.join(SHOTS, `${name}.png`) })
  }
  const { violations } = await new AxeBuilder({ page }).analyze()
  const wide = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth + 1)
  return [
    ...violations.map(({ id, nodes }) => `${name} ${id}: ${nodes.map(({ html }) => html.slice(0, 200)).join(' | ')}`),
    ...(wide ? [`${name} is wider than the screen`] : []),
  ]
}

const hrefsOf = (role: Role) => sideEntries([role], (key) => key).map(({ href }) => href)

for (const theme of ['limewash', 'night'] as const) {
  for (const role of ['planner', 'contractor', 'steward'] as const) {
    story(
      `every screen of the ${role} can be used by everybody, ${theme}`,
      async ({ sharedServer, page }, { project }) => {
        story.setTimeout(300_000)
        await page.addInitScript((chosen) => {
          localStorage.setItem('tallystone.look', JSON.stringify({ look: chosen, isBrightSun: false }))
        }, theme)
        const nameOf = (place: string) => `${project.name}-${theme}-${role}${place.replaceAll('/', '-')}`
        const faults: string[] = []
        await signIn(page, sharedServer, role)
        await isAtRest(page)

        for (const href of hrefsOf(role)) {
          await page.goto(sharedServer.url + href)
          faults.push(...(await look(page, nameOf(href))))
        }
        for (const [index, { from, open }] of NESTED.filter((nested) => nested.role === role).entries()) {
          await page.goto(sharedServer.url + from)
          await isAtRest(page)
          await page
            .getByRole('button', { name: open })
            .or(page.getByRole('row', { name: open }))
            .first()
            .click()
          await expect(page).not.toHaveURL(sharedServer.url + from)
          faults.push(...(await look(page, nameOf(`${from}-${index + 1}`))))
        }

        expect(faults).toEqual([])
      },
    )
  }

  story(`the doors of the product can be used by everybody, ${theme}`, async ({ sharedServer, page }, { project }) => {
    await page.addInitScript((chosen) => {
      localStorage.setItem('tallystone.look', JSON.stringify({ look: chosen, isBrightSun: false }))
    }, theme)
    const faults: string[] = []
    for (const place of ['/sign-in', '/reset', '/join/unknown']) {
      await page.goto(sharedServer.url + place)
      faults.push(...(await look(page, `${project.name}-${theme}-door${place.replaceAll('/', '-')}`)))
    }
    expect(faults).toEqual([])
  })
}
