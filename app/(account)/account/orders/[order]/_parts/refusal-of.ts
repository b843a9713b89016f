import { reasonWords } from '@/lib/messages/reasons'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'

/** Why the last press of a button on this page was refused; null when none was. */
export async function refusalOf(draft: string | undefined): Promise<string | null> {
  const kept = (await getFormDraft(draft, 'pay')) ?? (await getFormDraft(draft, 'check'))
  return kept && reasonWords(kept.reason)
}
