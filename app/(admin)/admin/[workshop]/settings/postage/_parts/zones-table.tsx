import { Money } from '@/components/format/money'
import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Table } from '@/components/ui/table'
import type { PostageZoneView } from '@/lib/contracts/settings'
import { countryName, isCountry } from '@/lib/core/data/country'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'

type Props = { slug: string; zones: PostageZoneView[]; currency: string }

/** The zones with what each service takes and costs. */
export function ZonesTable({ slug, zones, currency }: Props) {
  return (
    <Table
      caption={words.zones}
      rows={zones}
      rowKey={(row) => row.id}
      empty={words.zoneNone}
      columns={[
        { key: 'name', heading: words.zoneName, cell: (row) => row.name },
        {
          key: 'countries',
          heading: words.countries,
          cell: (row) =>
            row.countries.map((code) => (isCountry(code) ? countryName(code) : words.everywhere)).join(', '),
        },
        {
          key: 'services',
          heading: words.bands,
          cell: (row) => (
            <ul className="flex flex-col gap-1">
              {row.services.flatMap((service) =>
                service.bands.map(({ upTo, priceMinor }) => (
                  <li key={`${service.name} ${upTo}`}>
                    {service.name}, {words.upTo.toLowerCase()} {upTo} {words.grams}:{' '}
                    <Money minor={priceMinor} currency={currency} />
                  </li>
                )),
              )}
            </ul>
          ),
        },
      ]}
      actions={(row) => (
        <>
          <a href={`${paths.adminSettingsPage(slug, 'postage')}?zone=${row.id}#zone`}>{words.zoneChange}</a>
          <DeedForm action={paths.api.adminSettingsDeed(slug, 'postage/remove')} hidden={{ zone: row.id }}>
            <Button kind="plain">{words.zoneRemove}</Button>
          </DeedForm>
        </>
      )}
    />
  )
}
