import { Button } from '@/components/ui/button'
import { Sheet } from '@/components/ui/sheet'
import { TextField } from '@/components/ui/text-field'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'

/** A month of the books as a file. */
export function ExportSheet({ slug, month }: { slug: string; month: string }) {
  return (
    <Sheet title={words.export} id="export">
      <form method="get" action={paths.api.adminLedger(slug)} className="flex flex-col items-start gap-4">
        <TextField
          name="month"
          label={words.month}
          hint={words.monthHint}
          defaultValue={month}
          pattern="\d{4}-\d{2}"
          width="short"
        />
        <Button kind="secondary">{words.exportButton}</Button>
      </form>
    </Sheet>
  )
}
