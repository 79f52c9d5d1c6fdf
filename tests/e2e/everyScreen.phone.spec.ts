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
  { role: 'planner', from: '/rounds', open: /^Draw a district$/ },
  { role: 'planner', from: '/review', open: /^Open / },
  { role: 'planner', from: '/listed', open: /^Open / },
  { role: 'contractor', from: '/loads-ahead', open: /^Open / },
  { role: 'contractor', from: '/listed-buildings', open: /^Open / },
]

async function isAtRest(page: Page): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible({ timeout: 30_000 })
  await expect(page.getByText(/^(Loading|Reading the run) …$/)).toHaveCount(0, { timeout: 30_000 })
  await expect(page.locator('[data-ready="false"]')).toHaveCount(0, { timeout: 30_000 })
}

/**
 * The faults of a screen in both themes, told by its address; takes its pictures on the way. At night only the colours
 * differ, so only they are looked at again.
 */
async function look(page: Page, name: string): Promise<string[]> {
  await isAtRest(page)
  const byDay = await new AxeBuilder({ page }).analyze()
  const isTooWide = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth + 1)
  await picture(page, `${name}-limewash`)
  await page.emulateMedia({ colorScheme: 'dark' })
  const atNight = await new AxeBuilder({ page }).withRules(['color-contrast']).analyze()
  await picture(page, `${name}-night`)
  await page.emulateMedia({ colorScheme: 'light' })
  return [
    ...[...byDay.violations, ...atNight.violations].map(
      ({ id, nodes }) => `${name} ${id}: ${nodes.map(({ html }) => html.slice(0, 200)).join(' | ')}`,
    ),
    ...(isTooWide ? [`${name} is wider than the screen`] : []),
  ]
}

async function picture(page: Page, name: string): Promise<void> {
  if (SHOTS === undefined) return
  mkdirSync(SHOTS, { recursive: true })
  await page.screenshot({ path: path.join(SHOTS, `${name}.png`) })
}

const hrefsOf = (role: Role) => sideEntries([role], (key) => key).map(({ href }) => href)

for (const role of ['planner', 'contractor', 'steward'] as const) {
  story(`every screen of the ${role} can be used by everybody`, async ({ sharedServer, page }, { project }) => {
    story.setTimeout(300_000)
    const nameOf = (place: string) => `${project.name}-${role}${place.replaceAll('/', '-')}`
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
  })
}

story('the doors of the product can be used by everybody', async ({ sharedServer, page }, { project }) => {
  const faults: string[] = []
  for (const place of ['/sign-in', '/reset', '/join/unknown']) {
    await page.goto(sharedServer.url + place)
    faults.push(...(await look(page, `${project.name}-door${place.replaceAll('/', '-')}`)))
  }
  expect(faults).toEqual([])
})
