import { randomBytes } from 'node:crypto'
import { FormDraft } from '@/models'

const KEPT_MINUTES = 15
/** Never written down, not even for 15 minutes. */
const SECRET = /token|password|secret|card|(^|\.)code$/i

/** Keeps what was typed and what was wrong with it, for a form that comes back without JavaScript. Returns the draft's id. */
export async function keepDraft(draft: {
  form: string
  fields: Record<string, string>
  errors: Record<string, string>
  reason: string
}): Promise<string> {
  const id = randomBytes(24).toString('base64url')
  const values = Object.fromEntries(Object.entries(draft.fields).filter(([name]) => !SECRET.test(name)))
  await FormDraft.create({
    id,
    form: draft.form,
    values,
    errors: draft.errors,
    reason: draft.reason,
    expiresAt: new Date(Date.now() + KEPT_MINUTES * 60_000),
  })
  return id
}
