import { z } from 'zod'
import { DEED_RULES } from '@/lib/core/policy/deeds'
import { RUN_OPERATIONS, WORKSHOP_OPERATIONS } from './openapi/admin'
import type { Operation } from './openapi/operation'
import { MONEY_OPERATIONS } from './openapi/money'
import { ORDER_OPERATIONS } from './openapi/orders'
import { PACKING_OPERATIONS } from './openapi/packing'
import { PUBLIC_OPERATIONS } from './openapi/public'

/** Every call of the API; a test compares it with the route files. The sandbox's own are no part of it. */
export const OPERATIONS: readonly Operation[] = [
  ...PUBLIC_OPERATIONS,
  ...ORDER_OPERATIONS,
  ...WORKSHOP_OPERATIONS,
  ...RUN_OPERATIONS,
  ...MONEY_OPERATIONS,
  ...PACKING_OPERATIONS,
]

const PROBLEM = {
  type: 'object',
  required: ['type', 'title', 'status'],
  properties: {
    type: { type: 'string' },
    title: { type: 'string', description: 'A sentence that says what to do.' },
    status: { type: 'integer' },
    reason: { type: 'string', description: 'snake_case; finishes "refused because".' },
    detail: { type: 'string' },
    errors: {
      type: 'object',
      additionalProperties: { type: 'string' },
      description: 'A sentence per field, by its dotted path.',
    },
    requestId: { type: 'string' },
  },
}

const schemaOf = (schema: z.ZodType) => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' })
  return rest
}

/** The API as OpenAPI 3.1, made from the contracts its handlers read. */
export function openApi(site: { baseUrl: string; version: string }) {
  const paths: Record<string, Record<string, unknown>> = {}
  for (const operation of OPERATIONS)
    (paths[operation.path] ??= {})[operation.method.toLowerCase()] = describe(operation)
  return {
    openapi: '3.1.0',
    info: { title: 'Brimline', version: site.version },
    servers: [{ url: site.baseUrl }],
    paths,
    components: {
      schemas: { Problem: PROBLEM },
      securitySchemes: { session: { type: 'apiKey', in: 'cookie', name: '__Host-brimline.session' } },
    },
  }
}

function describe(operation: Operation) {
  const { summary, body, media = 'application/json', status = 200, answer } = operation
  return {
    summary,
    description: `For: ${audienceOf(operation).join(', ')}.`,
    ...(audienceOf(operation).includes('anybody') ? {} : { security: [{ session: [] }] }),
    parameters: parametersOf(operation),
    ...(body && {
      requestBody: { required: true, content: contentOf(schemaOf(body)) },
    }),
    responses: {
      [status]: { description: answer, ...(status < 300 && { content: { [media]: {} } }) },
      default: {
        description: 'A refusal (RFC 9457)',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  }
}

/** Each body may also come as a form, its fields named by their dotted paths. */
const contentOf = (schema: unknown) => ({
  'application/json': { schema },
  'application/x-www-form-urlencoded': { schema },
})

function audienceOf({ deed }: Operation): readonly string[] {
  return deed === 'self' || deed === 'anybody' ? [deed] : DEED_RULES[deed].for
}

function parametersOf({ path, query, isIdempotent }: Operation) {
  const inPath = [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: { type: 'string' },
  }))
  const inQuery = Object.entries(query?.shape ?? {}).map(([name, schema]) => ({
    name,
    in: 'query',
    required: !(schema as z.ZodType).safeParse(undefined).success,
    schema: schemaOf(schema as z.ZodType),
  }))
  const key = { name: 'Idempotency-Key', in: 'header', required: false, schema: { type: 'string' } }
  return [...inPath, ...inQuery, ...(isIdempotent ? [key] : [])]
}
