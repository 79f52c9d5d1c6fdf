import { chmodSync, mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import os from 'node:os'
import path from 'node:path'
import { Client } from 'pg'
import { afterAll, expect, it } from 'vitest'
import { clusterPort, startCluster, stopCluster } from './cluster.mjs'

const folder = mkdtempSync(path.join(os.tmpdir(), 'tallystone-cluster-'))
chmodSync(folder, 0o711)
const secrets = { superuserPassword: 'for-the-superuser', ownerPassword: 'for-the-owner', appPassword: 'for-the-app' }
const start = () => startCluster({ folder, secrets })

afterAll(async () => {
  await stopCluster(folder)
  rmSync(folder, { recursive: true, force: true })
})

async function ask(url: string, sql: string): Promise<unknown[]> {
  const client = new Client({ connectionString: url })
  await client.connect()
  try {
    return (await client.query(sql)).rows
  } finally {
    await client.end()
  }
}

it('keeps what was written and its port from one start to the next', async () => {
  const first = await start()
  await ask(first.ownerUrl, 'CREATE TABLE kept (a int); INSERT INTO kept VALUES (7)')
  await first.stop()
  expect(await clusterPort(folder)).toBeUndefined()

  const second = await start()

  expect(second.port).toBe(first.port)
  expect(await ask(second.ownerUrl, 'SELECT a FROM kept')).toEqual([{ a: 7 }])
  await second.stop()
})

it('takes another port when its own was taken meanwhile', async () => {
  const first = await start()
  await first.stop()
  const squatter = createServer().listen(first.port, '127.0.0.1')

  const second = await start()

  expect(second.port).not.toBe(first.port)
  expect(await ask(second.appUrl, 'SELECT 1 AS one')).toEqual([{ one: 1 }])
  await second.stop()
  squatter.close()
})

it('joins a cluster that already runs', async () => {
  const [first, second] = [await start(), await start()]

  expect(second.port).toBe(first.port)
  await first.stop()
})

it('lets nobody in without a password, and only by loopback', async () => {
  const cluster = await start()
  const url = new URL(cluster.appUrl)
  url.password = 'wrong'

  await expect(ask(url.href, 'SELECT 1')).rejects.toThrow('password authentication failed')
  expect(await ask(cluster.adminUrl, 'SHOW listen_addresses')).toEqual([{ listen_addresses: '127.0.0.1' }])
  expect(await ask(cluster.adminUrl, 'SHOW unix_socket_directories')).toEqual([{ unix_socket_directories: '' }])
  await cluster.stop()
})
