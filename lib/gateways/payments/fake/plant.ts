import 'server-only'
import { idFor } from '@/lib/gateways/payments/fake/chance'
import { type Kind, PREFIX } from '@/lib/gateways/payments/fake/kinds'
import { sandboxPool } from '@/lib/gateways/payments/fake/pool'

// Differences planted in the fake's books, to see whether the daily comparison finds them. For tests.

async function one(text: string, values: readonly unknown[]): Promise<void> {
  const { rowCount } = await (await sandboxPool()).query(text, [...values])
  if (rowCount !== 1) throw new RangeError(`plant: expected one object, met ${rowCount}`)
}

/** Changes fields of an object behind everybody's back: another amount, another currency. */
export async function plantChange(id: string, fields: Record<string, unknown>): Promise<void> {
  await one('update sandbox.objects set body = body || $2::jsonb where id = $1', [id, JSON.stringify(fields)])
}

/** Takes an object out of the provider's lists. */
export async function plantLoss(id: string): Promise<void> {
  await one('delete from sandbox.objects where id = $1', [id])
}

/** Puts a twin of an object under an id of its own into the lists; answers the id. */
export async function plantTwin(id: string, kind: Kind, n: number): Promise<string> {
  const twin = idFor(`${PREFIX[kind]}planted`, n)
  await one(
    `insert into sandbox.objects (id, account, kind, created, body, hidden)
     select $2, account, kind, created, body || jsonb_build_object('id', $2::text), hidden
     from sandbox.objects where id = $1`,
    [id, twin],
  )
  return twin
}
