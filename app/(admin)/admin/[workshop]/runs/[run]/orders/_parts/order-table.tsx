import { Money } from '@/components/format/money'
import { When } from '@/components/format/when'
import { Table } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'
import type { RunOrderItem, RunPage } from '@/lib/contracts/run-page'
import { countryName } from '@/lib/core/data/country'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

type Props = {
  page: RunPage
  list: { items: RunOrderItem[]; next: number | null }
  here: string
  state?: string | undefined
  before?: number | undefined
}

/** A run's orders, newest first; the states it has, as links, narrow the list. */
export function OrderTable({ page, list, here, state, before }: Props) {
  const { workshop, currency } = page
  return (
    <Table
      caption={words.ordersCaption}
      rows={list.items}
      rowKey={(row) => row.id}
      empty={state ? words.ordersNoneInState : words.ordersNone}
      filter={<StateLinks page={page} here={here} state={state} />}
      firstHref={before === undefined ? undefined : withParams(here, { state }, {})}
      nextHref={list.next === null ? undefined : withParams(here, { state }, { before: String(list.next) })}
      columns={[
        {
          key: 'number',
          heading: words.order,
          cell: (row) => (
            <a href={paths.adminOrder(workshop.slug, row.id)} className="figures inline-flex min-h-6">
              {row.number}
            </a>
          ),
        },
        { key: 'buyer', heading: words.buyer, cell: (row) => row.name ?? '–' },
        { key: 'country', heading: words.country, cell: (row) => countryName(row.country) },
        {
          key: 'state',
          heading: words.state,
          cell: (row) =>
            [
              words.orderStates[row.state] ?? row.state,
              row.kind === 'manual' ? words.manual : '',
              row.isDisputed ? words.disputed : '',
            ]
              .filter(Boolean)
              .join(', '),
        },
        { key: 'lines', heading: words.units, cell: (row) => linesOf(row) },
        {
          key: 'total',
          heading: words.total,
          kind: 'figures',
          cell: (row) => <Money minor={row.totalMinor} currency={currency} locale={workshop.locale} />,
        },
        {
          key: 'placed',
          heading: words.placedOn,
          cell: (row) => <When at={row.placedAt} zone={workshop.timeZone} />,
        },
      ]}
    />
  )
}

const linesOf = ({ lines }: RunOrderItem) =>
  lines.map(({ offer, quantity }) => `${quantity} × ${words.offers[offer]}`).join(', ')

function StateLinks({ page, here, state }: Pick<Props, 'page' | 'here' | 'state'>) {
  const link = (to: string | undefined, label: string, count?: number) => (
    <li key={to ?? 'all'}>
      <a
        href={withParams(here, {}, { state: to ?? null })}
        aria-current={state === to ? 'true' : undefined}
        className="inline-flex min-h-6 gap-1.5 aria-[current]:font-semibold"
      >
        {label}
        {count === undefined ? null : <span className="figures text-quiet">{count}</span>}
      </a>
    </li>
  )
  return (
    <ul className="flex flex-wrap gap-x-4 gap-y-1 text-15">
      {link(undefined, words.allStates)}
      {Object.entries(page.orders).map(([name, count]) => link(name, words.orderStates[name] ?? name, count))}
    </ul>
  )
}
