import { Button, LinkButton } from '@/components/ui/button'
import { SelectField } from '@/components/ui/select-field'
import { offerKind } from '@/lib/contracts/fields'
import type { PackSummary, QueueQuery } from '@/lib/contracts/packing'
import { countryName } from '@/lib/core/data/country'
import { packingWords as words } from '@/lib/messages/packing'
import { papers } from '@/lib/messages/papers'
import { paths } from '@/lib/paths'

const offers = offerKind.options.map((value) => ({ value, label: papers.offers[value] }))
const asThemselves = (values: readonly string[]) => values.map((value) => ({ value, label: value }))

type Props = { slug: string; query: QueueQuery; summary: PackSummary }

/** Narrows the queue by what is packed, where it goes and how; the choice stands in the address of the page. */
export function QueueFilter({ slug, query, summary }: Props) {
  const fields = [
    { name: 'offer', options: offers },
    { name: 'choice', options: asThemselves(summary.choices) },
    {
      name: 'country',
      options: summary.countries.map((value) => ({ value, label: countryName(value) })),
    },
    { name: 'service', options: asThemselves(summary.services) },
  ] as const
  const isNarrowed = Boolean(query.group) || fields.some(({ name }) => query[name])
  return (
    <form action={paths.packing(slug)} className="flex flex-wrap items-end gap-3">
      {fields.map(({ name, options }) => (
        <SelectField
          key={name}
          name={name}
          label={words.filter[name]}
          options={options}
          empty={words.filter.all}
          form={{ values: query }}
          width="short"
          required={false}
        />
      ))}
      <Button kind="secondary">{words.filter.apply}</Button>
      {isNarrowed ? (
        <LinkButton kind="plain" href={paths.packing(slug)}>
          {words.filter.clear}
        </LinkButton>
      ) : null}
    </form>
  )
}
