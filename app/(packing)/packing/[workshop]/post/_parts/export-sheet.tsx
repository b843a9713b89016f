import { Button, LinkButton } from '@/components/ui/button'
import { Sheet } from '@/components/ui/sheet'
import { TextField } from '@/components/ui/text-field'
import { POST_COLUMNS } from '@/lib/contracts/tracking'
import { postWords } from '@/lib/messages/post'
import { paths } from '@/lib/paths'
import { withParams } from '@/components/ui/with-params'

const words = postWords.csv

/** Sets of columns that carriers commonly ask for. */
const SETS = {
  all: POST_COLUMNS.join(','),
  address: 'order,name,organization,line1,line2,line3,city,region,postcode,country,phone,service,grams',
  customs: 'order,name,country,contents,code,origin,value,currency,grams,form,taxNumber',
}

/** The list for a carrier's upload, with the columns it wants. */
export function ExportSheet({ slug }: { slug: string }) {
  return (
    <Sheet title={words.title} id="export">
      <p className="max-w-words pb-3 text-15 text-quiet">{words.hint}</p>
      <div className="flex flex-wrap gap-3">
        {(['all', 'address', 'customs'] as const).map((set) => (
          <LinkButton key={set} href={withParams(paths.api.packingPostCsv(slug), {}, { columns: SETS[set] })}>
            {words.sets[set]}
          </LinkButton>
        ))}
      </div>
      <form action={paths.api.packingPostCsv(slug)} className="flex flex-wrap items-end gap-3 pt-4">
        <TextField
          name="columns"
          label={words.choose}
          hint={words.chooseHint(POST_COLUMNS)}
          defaultValue={SETS.address}
          width="full"
          autoComplete="off"
        />
        <Button kind="secondary">{words.button}</Button>
      </form>
    </Sheet>
  )
}
