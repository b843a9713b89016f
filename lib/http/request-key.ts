import { createHash } from 'node:crypto'
import { UniqueConstraintError } from 'sequelize'
import { RequestKey } from '@/models'

/** A request still running after this long is taken to have died with its process. */
const LEASE_MS = 60_000

type Held =
  | { state: 'fresh'; row: RequestKey }
  | { state: 'replay'; status: number; body: string }
  | { state: 'refused'; reason: 'other_body_for_key' | 'still_running' }

/** Takes the Idempotency-Key of a person's request, or says what became of it: replayed, other body, still running. */
export async function takeRequestKey(key: string, scope: string, text: string): Promise<Held> {
  const bodyHash = createHash('sha256').update(text).digest('hex')
  try {
    const row = await RequestKey.create({ key, scope, bodyHash, startedAt: new Date() })
    return { state: 'fresh', row }
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error
  }
  const row = await RequestKey.findOne({ where: { key, scope } })
  if (!row) return takeRequestKey(key, scope, text)
  if (row.bodyHash !== bodyHash) return { state: 'refused', reason: 'other_body_for_key' }
  if (row.status !== null) return { state: 'replay', status: row.status, body: row.answer ?? '' }
  if (Date.now() - row.startedAt.getTime() < LEASE_MS) return { state: 'refused', reason: 'still_running' }
  await row.update({ startedAt: new Date() })
  return { state: 'fresh', row }
}

/** Keeps the answer for the next time; a refusal that a later try could change is not kept. */
export async function settleRequestKey(row: RequestKey, answer: Response): Promise<void> {
  if (answer.status >= 400) await row.destroy()
  else await row.update({ status: answer.status, answer: await answer.clone().text() })
}
