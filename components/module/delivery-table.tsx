import { Money } from '@/components/format/money'
import { Table } from '@/components/ui/table'
import type { Delivery, OfferDelivery } from '@/lib/contracts/modules'
import { countryName, isCountry } from '@/lib/core/data/country'
import { deliveryWords as words } from '@/lib/messages/delivery'
import { offerWords } from '@/lib/messages/public'

export type TaxFacts = { pricesIncludeTax: boolean; taxNote: string | null }

/** One piece of each form, delivered to one country, and the tax that is part of it. */
export function DeliveryTable({ delivery, tax }: { delivery: Delivery; tax: TaxFacts }) {
  const { country, currency, offers } = delivery
  const sum = (minor: number | null) =>
    minor === null ? words.open : <Money minor={minor} currency={currency} />
  return (
    <div className="flex flex-col gap-3">
      <Table
        caption={words.caption(isCountry(country) ? countryName(country) : country)}
        rows={offers}
        rowKey={(row) => row.offer}
        empty={words.noOffers}
        columns={[
          { key: 'offer', heading: words.offer, cell: (row) => offerWords[row.offer] },
          { key: 'price', heading: words.price, kind: 'figures', cell: (row) => sum(row.priceMinor) },
          { key: 'deposit', heading: words.deposit, kind: 'figures', cell: (row) => sum(row.depositMinor) },
          {
            key: 'postage',
            heading: words.postage,
            kind: 'figures',
            cell: (row) => (row.postageMinor === null ? words.notPosted : sum(row.postageMinor)),
          },
          {
            key: 'total',
            heading: words.total,
            kind: 'figures',
            cell: (row) => (row.postageMinor === null ? '' : sum(row.totalMinor)),
          },
        ]}
      />
      <ul className="flex max-w-words flex-col gap-1 text-15 text-quiet">
        {notesOf(delivery, tax).map((note) => (
          <li key={note}>{note}</li>
        ))}
      </ul>
    </div>
  )
}

/** Each sentence once, however many forms it is about. */
function notesOf({ offers }: Delivery, tax: TaxFacts): string[] {
  const about = (row: OfferDelivery) => [
    ...(row.state === 'open' ? [] : [`${offerWords[row.offer]}: ${row.reason ?? words.states[row.state]}`]),
    ...(row.duties === 'none' || row.state !== 'open' ? [] : [words.duties[row.duties]]),
    ...(row.note ? [row.note] : []),
  ]
  return [...new Set([...taxNotes(offers, tax), ...offers.flatMap(about)])]
}

function taxNotes(offers: readonly OfferDelivery[], { pricesIncludeTax, taxNote }: TaxFacts): string[] {
  const [rate, ...others] = new Set(offers.map(({ taxBasisPoints }) => taxBasisPoints))
  if (rate === undefined) return []
  if (others.length > 0) return [words.tax.mixed]
  if (rate === 0) return [taxNote ?? words.tax.none]
  return [pricesIncludeTax ? words.tax.included(rate) : words.tax.added(rate)]
}
