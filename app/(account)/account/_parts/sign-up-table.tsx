import { When } from '@/components/format/when'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { OwnSignUp } from '@/lib/contracts/account'
import { accountWords as words } from '@/lib/messages/account'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

/** A person's statements of interest. */
export function SignUpTable({ signUps }: { signUps: readonly OwnSignUp[] }) {
  return (
    <Sheet title={words.signUps} id="sign-ups">
      <Table
        caption={words.signUps}
        captionHidden
        rows={signUps}
        rowKey={({ id }) => id}
        empty={words.noSignUps}
        columns={[
          { key: 'module', heading: words.module, cell: moduleOf },
          { key: 'workshop', heading: words.workshop, cell: ({ workshop }) => workshop.name },
          { key: 'what', heading: words.units, cell: ({ offer }) => offerWords[offer] },
          { key: 'quantity', heading: words.quantity, kind: 'figures', cell: ({ quantity }) => quantity },
          { key: 'state', heading: words.state, cell: ({ state }) => words.signUpStates[state] ?? state },
          {
            key: 'since',
            heading: words.since,
            cell: ({ at, timeZone }) => <When at={at} zone={timeZone} />,
          },
        ]}
      />
      <p className="pt-3 text-15 text-quiet">{words.takeBack}</p>
    </Sheet>
  )
}

const moduleOf = ({ workshop, module }: OwnSignUp) => (
  <a href={paths.module(workshop.slug, module.slug)}>{module.name}</a>
)
