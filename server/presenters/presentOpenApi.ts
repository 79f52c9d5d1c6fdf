import { z } from 'zod'
import { API_PREFIX, type Endpoint } from '@/shared/api/defineEndpoint'
import { problem } from '@/shared/schemas/problem'

type Json = Record<string, unknown>

/**
 * The contract as an OpenAPI 3.1 document. Its shapes are JSON Schema 2020-12, written from the very schemas
 * that judge requests and replies, so that the document cannot say anything else than the server does.
 *
 * @param contract endpoints by name; the name becomes the operation's id
 * @param version of the product
 * @see OpenAPI Specification 3.1.0, sections 4.8.1 (document) and 4.8.10 (operation)
 */
export function presentOpenApi(contract: Readonly<Record<string, Endpoint>>, version: string) {
  const paths: Record<string, Json> = {}
  for (const [name, endpoint] of Object.entries(contract)) {
    const path = endpoint.path.replaceAll(/:(\w+)/g, '{$1}')
    paths[path] = { ...paths[path], [endpoint.method.toLowerCase()]: presentOperation(name, endpoint) }
  }
  return {
    openapi: '3.1.0' as const,
    jsonSchemaDialect: 'https://json-schema.org/draft/2020-12/schema',
    info: {
      title: 'Tallystone',
      version,
      description: 'A district surveyed as material stock. Faults are answered as application/problem+json (RFC 9457).',
    },
    servers: [{ url: API_PREFIX }],
    paths,
    components: {
      securitySchemes: { accessToken: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' } },
      schemas: { Problem: writeSchema(problem, 'output') },
    },
  }
}

function presentOperation(name: string, endpoint: Endpoint): Json {
  return {
    operationId: name,
    summary: endpoint.summary,
    description: sayAudience(endpoint),
    security: endpoint.audience === 'public' ? [] : [{ accessToken: [] }],
    parameters: [...presentParameters(endpoint.params, 'path'), ...presentParameters(endpoint.query, 'query')],
    ...presentBody(endpoint),
    responses: {
      [String(endpoint.status ?? 200)]: {
        description: 'Done.',
        content: { 'application/json': { schema: writeSchema(endpoint.response, 'output') } },
      },
      default: {
        description: 'What happened, what is safe and what to do, with a fault for every field.',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  }
}

function sayAudience({ audience }: Endpoint): string {
  if (audience === 'public') return 'Anybody may call this.'
  if (audience === 'signed-in') return 'Anybody signed in may call this.'
  return `For the role ${audience.join(' or ')}.`
}

function presentParameters(schema: z.ZodType, place: 'path' | 'query'): Json[] {
  const { properties = {}, required = [] } = writeSchema(schema, 'input') as {
    properties?: Record<string, Json>
    required?: string[]
  }
  return Object.entries(properties).map(([name, shape]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: shape,
  }))
}

function presentBody({ method, body }: Endpoint): Json {
  if (method === 'GET') return {}
  const schema = writeSchema(body, 'input')
  const isEmpty = schema.type === 'object' && Object.keys(schema.properties ?? {}).length === 0
  return isEmpty ? {} : { requestBody: { required: true, content: { 'application/json': { schema } } } }
}

/** Shapes a schema cannot say (a date made from text, bytes) are left open. */
function writeSchema(schema: z.ZodType, io: 'input' | 'output') {
  const { $schema: _dialect, ...shape } = z.toJSONSchema(schema, { io, unrepresentable: 'any', reused: 'inline' })
  return shape
}
