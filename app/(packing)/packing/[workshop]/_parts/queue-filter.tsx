import { Button, LinkButton } from '@/components/ui/button'
import { SelectField } from '@/components/ui/select-field'
import { offerKind } from '@/lib/contracts/fields'
import type { QueueQuery } from '@/lib/contracts/packing'
import { countryName } from '@/lib/core/data/country'
import { packingWords as words } from '@/lib/messages/packing'
import { papers } from '@/lib/messages/papers'
import { paths } from '@/lib/paths'

const offers = offerKind.options.map((value) => ({ value, label: papers.offers[value] }))

/** Narrows the queue by what is packed and where it goes; the choice stands in the address of the page. */
export function QueueFilter(props: { slug: string; query: QueueQuery; countries: readonly string[] }) {
  const { slug, query, countries } = props
  const places = countries.map((value) => ({ value, label: countryName(value) }))
  const form = { values: query }
  return (
    <form action={paths.packing(slug)} className="flex flex-wrap items-end gap-3">
      <SelectField
        name="offer"
        label={words.filter.offer}
        options={offers}
        empty={words.filter.all}
        form={form}
        width="short"
        required={false}
      />
      <SelectField
        name="country"
        label={words.filter.country}
        options={places}
        empty={words.filter.all}
        form={form}
        width="short"
        required={false}
      />
      <Button kind="secondary">{words.filter.apply}</Button>
      {query.offer || query.country ? (
        <LinkButton kind="plain" href={paths.packing(slug)}>
          {words.filter.clear}
        </LinkButton>
      ) : null}
    </form>
  )
}
