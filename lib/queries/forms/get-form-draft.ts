import 'server-only'
import { Op } from 'sequelize'
import { FormDraft } from '@/models'

export type KeptForm = { values: Record<string, string>; errors: Record<string, string>; reason: string }

/** What was typed into a form that was refused, with the sentences at its fields; null when it is gone (15 minutes) or of another form. */
export async function getFormDraft(id: string | undefined, form: string): Promise<KeptForm | null> {
  if (!id || id.length > 64) return null
  const row = await FormDraft.findOne({ where: { id, form, expiresAt: { [Op.gt]: new Date() } } })
  return row && { values: row.values, errors: row.errors, reason: row.reason }
}
