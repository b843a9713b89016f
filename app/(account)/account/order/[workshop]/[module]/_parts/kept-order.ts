import type { FormState } from '@/components/ui/form-state'
import { keptForm } from '@/components/forms/kept-form'

type Kept = { values: Record<string, string>; errors: Record<string, string>; reason: string }

/**
 * An order form that came back. Rows left at zero were no lines of the order that was judged, so the sentences move back
 * to the rows they belong to; a form that was right and is only changed has none.
 */
export function keptOrder(kept: Kept | null): FormState | undefined {
  if (kept?.reason === 'checked') return { values: kept.values }
  const form = keptForm(kept)
  if (!form || !kept) return form
  const rows = rowsWithUnits(kept.values)
  const moved = Object.entries(form.errors ?? {}).map(([field, words]): [string, string] => [
    field.replace(/^lines\.(\d+)/, (_, n: string) => `lines.${rows[Number(n)] ?? n}`),
    words,
  ])
  return { values: form.values ?? {}, errors: Object.fromEntries(moved) }
}

function rowsWithUnits(values: Record<string, string>): number[] {
  return Object.entries(values)
    .flatMap(([name, typed]) => {
      const row = /^lines\.(\d+)\.quantity$/.exec(name)?.[1]
      return row !== undefined && typed.trim() !== '' && typed.trim() !== '0' ? [Number(row)] : []
    })
    .sort((a, b) => a - b)
}
