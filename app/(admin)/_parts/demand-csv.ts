import type { DemandCount, InterestBoard } from '@/lib/contracts/demand'
import { plainMoney } from '@/lib/core/money/plain'
import { demandWords as words } from '@/lib/messages/demand'

/** The columns and rows of the counted interest, exactly what the page shows. */
export function demandCsv(board: InterestBoard): [columns: string[], rows: string[][]] {
  const { csv } = words
  const rowsOf = (what: string, counts: readonly DemandCount[], nameOf: (key: string) => string) =>
    counts.map(({ key, people, units }) => [what, nameOf(key), String(people), String(units)])
  const priceOf = (key: string) =>
    key === '' ? words.notAsked : `${plainMoney(Number(key), board.currency)} ${board.currency}`
  const offerOf = (key: string) => words.offers[key] ?? key
  return [
    [csv.what, csv.answer, csv.people, csv.units],
    [
      ...board.overTime.buckets.map(({ from, people, units }) => [
        words.overTime,
        from,
        String(people),
        String(units),
      ]),
      ...rowsOf(words.byOffer, board.byOffer, offerOf),
      ...rowsOf(words.byCertainty, board.byCertainty, (key) => words.classes[key as 'certain']),
      ...rowsOf(words.byCountry, board.byCountry, words.country),
      ...board.byPrice.flatMap(({ offer, prices }) =>
        rowsOf(`${words.byPrice}: ${offerOf(offer)}`, prices, priceOf),
      ),
    ],
  ]
}
