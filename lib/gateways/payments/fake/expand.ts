import 'server-only'
import type { Books } from '@/lib/gateways/payments/fake/books'
import { invalid } from '@/lib/gateways/payments/fake/errors'

type Plain = Record<string, unknown>

async function objectById(books: Books, id: string): Promise<unknown> {
  const { rows } = await books.sql.query('select body from sandbox.objects where id = $1 and account = $2', [
    id,
    books.account,
  ])
  return rows[0]?.body ?? id
}

async function expandAt(books: Books, target: unknown, path: readonly string[]): Promise<void> {
  const [field, ...rest] = path
  if (field === undefined || typeof target !== 'object' || target === null) return
  if (Array.isArray(target)) {
    for (const item of target) await expandAt(books, item, path)
    return
  }
  const plain = target as Plain
  if (typeof plain[field] === 'string') plain[field] = await objectById(books, plain[field])
  await expandAt(books, plain[field], rest)
}

/** Replaces ids by their objects along each path, four levels at most, as the provider does. */
export async function expand(books: Books, answer: object, wanted: readonly string[]): Promise<object> {
  const copy = structuredClone(answer)
  for (const path of wanted) {
    const levels = path.split('.')
    if (levels.length > 4)
      throw invalid(`You cannot expand more than 4 levels of a property: ${path}`, 'expand')
    await expandAt(books, copy, levels)
  }
  return copy
}
