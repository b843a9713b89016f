import { Table } from '@/components/ui/table'
import type { SettingsView } from '@/lib/contracts/settings'
import { countryName } from '@/lib/core/data/country'
import { offerWords } from '@/lib/messages/public'
import { settingsWords as words } from '@/lib/messages/settings'

const states: Record<string, string> = words.destinationStates
const offers: Record<string, string> = offerWords

/** Countries that are closed or paused, and why. */
export function ClosedTable({ rows }: { rows: SettingsView['closedDestinations'] }) {
  return (
    <Table
      caption={words.closedDestinations}
      rows={rows}
      rowKey={(row) => `${row.module} ${row.offer} ${row.country}`}
      empty={words.noneClosed}
      columns={[
        { key: 'country', heading: words.country, cell: (row) => countryName(row.country) },
        { key: 'module', heading: words.destinationModule, cell: (row) => row.module },
        { key: 'offer', heading: words.offer, cell: (row) => offers[row.offer] },
        { key: 'state', heading: words.destinationState, cell: (row) => states[row.state] },
        { key: 'reason', heading: words.reason, cell: (row) => row.reason },
      ]}
    />
  )
}
