import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { Table } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'
import type { TaxReport } from '@/lib/contracts/money-desk'
import { countryName } from '@/lib/core/data/country'
import { moneyWords as words } from '@/lib/messages/money-desk'

type Props = { report: TaxReport; here: string; csv: string }

/** What fell due by month, country and rate; the years narrow it. */
export function TaxTable({ report, here, csv }: Props) {
  const { year, years, currency, rows } = report
  const money = (minor: number) => <Money minor={minor} currency={currency} />
  return (
    <Table
      caption={words.taxCaption(year)}
      rows={rows}
      rowKey={(row) => `${row.month} ${row.country} ${row.basisPoints}`}
      empty={words.taxNone}
      csvHref={csv}
      filter={
        <ul aria-label={words.year} className="flex flex-wrap gap-x-4 gap-y-1 text-15">
          {years.map((each) => (
            <li key={each}>
              <a
                href={withParams(here, {}, { year: each })}
                aria-current={each === year ? 'true' : undefined}
                className="figures inline-flex min-h-6 aria-[current]:font-semibold"
              >
                {each}
              </a>
            </li>
          ))}
        </ul>
      }
      columns={[
        { key: 'month', heading: words.month, cell: (row) => words.writtenMonth(row.month) },
        { key: 'country', heading: words.country, cell: (row) => countryName(row.country) },
        {
          key: 'rate',
          heading: words.rate,
          kind: 'figures',
          cell: (row) => <Percent basisPoints={row.basisPoints} />,
        },
        { key: 'net', heading: words.net, kind: 'figures', cell: (row) => money(row.netMinor) },
        { key: 'tax', heading: words.taxSum, kind: 'figures', cell: (row) => money(row.taxMinor) },
        { key: 'gross', heading: words.gross, kind: 'figures', cell: (row) => money(row.grossMinor) },
      ]}
    />
  )
}
