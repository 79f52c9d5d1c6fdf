import { expect } from '@playwright/test'
import { story } from '@/tests/support/story'

story(
  'opens without the server once it was visited, also at a deep link and in a newly opened browser',
  async ({ appServer, phone }) => {
    const first = await phone.open()
    const page = await first.newPage()
    await page.goto(appServer.url)
    await page.evaluate(() => navigator.serviceWorker.ready)
    await expect(page.locator('#root > *').first()).toBeVisible()
    await first.close()

    await appServer.stop()
    const second = await phone.open()
    const again = await second.newPage()
    for (const address of ['/', '/street']) {
      await again.goto(appServer.url + address)
      await expect(again.locator('#root > *').first()).toBeVisible()
    }
    const answer = await again.evaluate(() =>
      fetch('/api/ready').then(
        () => 'answered',
        () => 'no answer',
      ),
    )
    expect(answer).toBe('no answer')

    await appServer.start()
    expect(await again.evaluate(() => fetch('/api/ready').then((response) => response.status))).toBe(200)
    await second.close()
  },
)

story('asks nobody but its own server for anything', async ({ sharedServer, page }) => {
  const strangers: string[] = []
  page.on('request', (request) => {
    if (!/^(?:data|blob):/.test(request.url()) && new URL(request.url()).origin !== sharedServer.url) {
      strangers.push(request.url())
    }
  })
  await page.goto(sharedServer.url)
  await expect(page.locator('#root > *').first()).toBeVisible()
  await page.evaluate(() => navigator.serviceWorker.ready)

  expect(strangers).toEqual([])
})
