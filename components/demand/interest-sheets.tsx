import { TimeBars } from '@/components/charts/time-bars'
import { Columns, Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { Sheet } from '@/components/ui/sheet'
import type { InterestBoard } from '@/lib/contracts/demand'
import { formatMoney } from '@/lib/core/money/format'
import { demandWords as words } from '@/lib/messages/demand'
import { CountTable } from './count-table'

/** Confirmed sign-ups, counted by everything they were asked. */
export function InterestSheets({ board, csvHref }: { board: InterestBoard; csvHref: string }) {
  const { currency, locale, overTime, byPrice } = board
  if (board.people === 0) return <Empty>{words.none}</Empty>
  const priceOf = (key: string) => (key === '' ? words.notAsked : formatMoney(Number(key), currency, locale))
  return (
    <Columns>
      <Stack>
        <Sheet title={words.overTime} id="over-time" aside={words.total(board)}>
          <TimeBars
            bars={overTime.buckets.map(({ from, people }) => ({ from, value: people }))}
            sentence={words.overTimeSentence(overTime)}
            unit={words.people}
          />
        </Sheet>
        <CountTable title={words.byCountry} rows={board.byCountry} nameOf={words.country} csvHref={csvHref} />
      </Stack>
      <Stack>
        <CountTable
          title={words.byOffer}
          rows={board.byOffer}
          nameOf={(key) => words.offers[key] ?? key}
          csvHref={csvHref}
        />
        <CountTable
          title={words.byCertainty}
          rows={board.byCertainty}
          nameOf={(key) => words.classes[key as keyof typeof words.classes]}
          csvHref={csvHref}
        />
        {byPrice.map(({ offer, prices }) => (
          <CountTable
            key={offer}
            title={`${words.byPrice}: ${words.offers[offer] ?? offer}`}
            rows={prices}
            nameOf={priceOf}
            csvHref={csvHref}
          />
        ))}
      </Stack>
    </Columns>
  )
}
