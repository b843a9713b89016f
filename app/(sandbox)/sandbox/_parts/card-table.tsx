import { Table } from '@/components/ui/table'
import { sandboxWords } from '@/lib/messages/sandbox'

const words = sandboxWords.cards

export function CardTable({ cards }: { cards: readonly { number: string; words: string }[] }) {
  return (
    <Table
      caption={words.lead}
      rows={cards}
      rowKey={({ number }) => number}
      empty={words.title}
      columns={[
        {
          key: 'number',
          heading: words.number,
          cell: ({ number }) => <span className="figures">{number}</span>,
        },
        { key: 'does', heading: words.does, cell: (card) => card.words },
      ]}
    />
  )
}
