import type { FormState } from '@/components/ui/form-state'
import { reasonWords } from '@/lib/messages/reasons'

type Kept = { values: Record<string, string>; errors: Record<string, string>; reason: string }

/** A form that came back, as the pieces show it: what was typed, sentences at the fields, or the refusal itself on top. */
export function keptForm(kept: Kept | null): FormState | undefined {
  if (!kept) return undefined
  const hasErrors = Object.keys(kept.errors).length > 0
  return { values: kept.values, errors: hasErrors ? kept.errors : { '': reasonWords(kept.reason) } }
}
