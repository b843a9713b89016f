import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { DemandBoard } from '@/lib/contracts/demand'
import { demandWords as words } from '@/lib/messages/demand'
import { writtenPercent } from '@/lib/messages/written'

/** What is believed of each class of people, and how many more of them would do. */
export function BeliefsSheet({ board }: { board: DemandBoard }) {
  return (
    <Sheet title={words.beliefs} id="beliefs">
      <p className="max-w-words pb-3 text-15 text-quiet">{words.beliefsLead}</p>
      <Table
        caption={words.beliefs}
        captionHidden
        rows={board.beliefs}
        rowKey={({ name }) => name}
        empty={words.none}
        columns={[
          { key: 'class', heading: words.class, cell: ({ name }) => words.classes[name] },
          {
            key: 'starting',
            heading: words.starting,
            kind: 'figures',
            cell: ({ starting }) => writtenPercent(starting),
          },
          { key: 'seen', heading: words.seen, kind: 'figures', cell: ({ seen }) => words.seenOf(seen) },
          {
            key: 'here',
            heading: words.here,
            cell: ({ name, here }) => (name === 'depositHolder' ? '–' : words.hereOf(here)),
          },
          {
            key: 'believed',
            heading: words.believed,
            kind: 'figures',
            cell: ({ believed }) => words.believedOf(believed),
          },
        ]}
      />
    </Sheet>
  )
}

/** How many more sign-ups of each kind would make the minimum sure enough. */
export function NeededSheet({ board }: { board: DemandBoard }) {
  if (board.needed.length === 0) return null
  return (
    <Sheet title={words.needed} id="needed">
      <p className="max-w-words pb-2 text-15 text-quiet">{words.neededLead}</p>
      <ul className="border-t border-rule">
        {board.needed.map(({ name, more }) => (
          <li key={name} className="border-b border-rule py-2">
            {words.neededOf(words.classes[name], more)}
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
