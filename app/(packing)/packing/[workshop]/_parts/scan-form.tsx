import { Button } from '@/components/ui/button'
import { TextField } from '@/components/ui/text-field'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** A scanner types the number of an order and sends Enter: its parcel opens. Changes nothing, so it is a GET. */
export function ScanForm({ slug, unknown }: { slug: string; unknown?: string }) {
  return (
    <form action={paths.packing(slug)} className="flex flex-wrap items-end gap-3 print:hidden" role="search">
      <TextField
        name="number"
        label={words.scan.label}
        hint={words.scan.hint}
        error={unknown ? words.scan.none(unknown) : undefined}
        inputMode="numeric"
        autoComplete="off"
        autoFocus
        className="figures"
      />
      <Button kind="secondary">{words.scan.find}</Button>
    </form>
  )
}
