import { expect, it } from 'vitest'
import { contract } from '@/shared/api/contract'
import { presentOpenApi } from './presentOpenApi'

const document = presentOpenApi(contract, '1.2.3')
interface Operation {
  operationId: string
  parameters: { name: string; in: string }[]
  security: unknown[]
}
const operations = Object.entries(document.paths).flatMap(([path, methods]) =>
  Object.entries(methods).map(([method, operation]) => ({ path, method, ...(operation as unknown as Operation) })),
)

it('names every endpoint of the contract once, with its method and path', () => {
  const written = operations.map(({ operationId, method, path }) => `${operationId} ${method} ${path}`).sort()
  const meant = Object.entries(contract).map(
    ([name, { method, path }]) => `${name} ${method.toLowerCase()} ${path.replaceAll(/:(\w+)/g, '{$1}')}`,
  )
  expect(written).toEqual(meant.sort())
})

it('describes each parameter a path has', () => {
  for (const { path, parameters } of operations) {
    const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name)
    const described = parameters.filter((parameter) => parameter.in === 'path').map(({ name }) => name)
    expect(described.sort(), path).toEqual(inPath.sort())
  }
})

it('asks for an access token everywhere but where anybody may call', () => {
  for (const { operationId, security } of operations) {
    expect(security.length === 0, operationId).toBe(contract[operationId]?.audience === 'public')
  }
})

it('resolves every reference it makes at the document itself', () => {
  const references = [...JSON.stringify(document).matchAll(/"\$ref":"([^"]+)"/g)].map(([, target]) => target)
  expect(new Set(references)).toEqual(new Set(['#/components/schemas/Problem']))
})
