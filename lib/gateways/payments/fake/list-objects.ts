import 'server-only'
import type Stripe from 'stripe'
import type { Books } from '@/lib/gateways/payments/fake/books'
import { invalid } from '@/lib/gateways/payments/fake/errors'
import type { Kind, Kinds } from '@/lib/gateways/payments/fake/kinds'
import type { Params } from '@/lib/gateways/payments/fake/params'

const COMPARE: Readonly<Record<string, string>> = { gt: '>', gte: '>=', lt: '<', lte: '<=' }

/**
 * A page of a list, newest first, with the provider's cursors (`starting_after`, `ending_before`), `limit` 1–100 and
 * `created` bounds; `filters` are top-level fields compared for equality.
 */
export async function listObjects<K extends Kind>(
  books: Books,
  kind: K,
  url: string,
  params: Params,
  filters: readonly string[],
): Promise<Stripe.ApiList<Kinds[K]>> {
  const limit = params.optional('limit') === undefined ? 10 : params.whole('limit')
  if (limit < 1 || limit > 100) throw invalid('limit must be between 1 and 100', 'limit')
  const values: unknown[] = [books.account, kind]
  const where = ['account = $1', 'kind = $2']
  const add = (condition: (place: string) => string, value: unknown) => {
    values.push(value)
    where.push(condition(`$${values.length}`))
  }
  for (const field of filters) {
    const value = params.optional(field)
    if (value !== undefined) add((place) => `body->>'${field}' = ${place}`, value)
  }
  for (const [operator, sign] of Object.entries(COMPARE)) {
    const bound = params.optional(`created.${operator}`)
    if (bound !== undefined) add((place) => `(body->>'created')::bigint ${sign} ${place}::bigint`, bound)
  }
  const after = params.optional('starting_after')
  const before = params.optional('ending_before')
  const seqOf = (place: string) => `(select seq from sandbox.objects where id = ${place})`
  if (after !== undefined) add((place) => `seq < ${seqOf(place)}`, after)
  if (before !== undefined) add((place) => `seq > ${seqOf(place)}`, before)
  const { rows } = await books.sql.query<{ body: Kinds[K] }>(
    `select body from sandbox.objects where ${where.join(' and ')}
     order by seq ${before === undefined ? 'desc' : 'asc'} limit ${limit + 1}`,
    values,
  )
  const page = rows.slice(0, limit).map(({ body }) => body)
  if (before !== undefined) page.reverse()
  return { object: 'list', data: page, has_more: rows.length > limit, url }
}
