import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import type { PlanPart, PlanQuote } from '@/lib/core/costs/plan-buying'
import { sequelize } from '@/lib/db/sequelize'
import { Part, Quote, QuoteBreak, RevisionLine } from '@/models'

/**
 * A revision's parts list as the cost plan wants it: each line with what lies in stock and the newest quote of each
 * supplier.
 * Locks: nothing. Writes: nothing. Joints are not known yet: an assembler's price stands per board and distinct part.
 */
export async function planParts(tx: Transaction, revisionId: string): Promise<PlanPart[]> {
  const lines = await RevisionLine.findAll({
    where: { revisionId },
    include: [
      {
        model: Part,
        as: 'part',
        required: true,
        include: [
          {
            model: Quote,
            as: 'quotes',
            separate: true,
            order: [['quotedOn', 'DESC']],
            include: breaksOfQuote,
          },
        ],
      },
    ],
    order: [['position', 'ASC']],
    transaction: tx,
  })
  const onHand = await stockOf(
    tx,
    lines.map(({ partId }) => partId),
  )
  return lines.map((line) => ({
    id: line.id,
    name: line.part!.code,
    perUnit: line.perUnit,
    neededFor: Object.keys(line.placedBy),
    placedBy: { ...line.placedBy },
    ...(line.choiceAnswerId === null ? {} : { choice: line.choiceAnswerId }),
    onHand: Math.max(0, onHand.get(line.partId) ?? 0),
    attrition: { basisPoints: line.attritionBasisPoints, atLeast: line.attritionAtLeast },
    joints: 0,
    byHand: false,
    quotes: newestPerSupplier(line.part!.quotes ?? []).map(asPlanQuote),
  }))
}

const breaksOfQuote = [{ model: QuoteBreak, as: 'breaks' }]

function newestPerSupplier(quotes: readonly Quote[]): Quote[] {
  return quotes.filter(
    ({ supplier, breaks }, i) =>
      (breaks?.length ?? 0) > 0 && quotes.findIndex((other) => other.supplier === supplier) === i,
  )
}

function asPlanQuote(quote: Quote): PlanQuote {
  const breaks = (quote.breaks ?? []).map(({ fromQuantity, unitPrice }) => ({
    from: fromQuantity,
    unitPrice,
  }))
  return {
    supplier: quote.supplier,
    currency: quote.currency,
    moq: quote.moq,
    multiple: quote.multiple,
    setup: quote.setupMinor,
    breaks: breaks.sort((a, b) => a.from - b.from),
  }
}

async function stockOf(tx: Transaction, partIds: string[]): Promise<Map<string, number>> {
  if (partIds.length === 0) return new Map()
  const rows = await sequelize.query<{ id: string; count: number }>(
    'select part_id as id, sum(change)::int as count from stock_moves where part_id in (:partIds) group by part_id',
    { replacements: { partIds }, type: QueryTypes.SELECT, transaction: tx },
  )
  return new Map(rows.map(({ id, count }) => [id, count]))
}
