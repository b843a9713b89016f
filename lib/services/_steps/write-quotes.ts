import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { minor } from '@/lib/core/brand'
import type { QuoteRow } from '@/lib/contracts/parts-list'
import { sequelize } from '@/lib/db/sequelize'
import { Quote, QuoteBreak } from '@/models'
import { inChunks } from './in-chunks'

type Quoted = { partId: string; quote: QuoteRow['quote'] }

/**
 * Writes quotes of parts. One of the same supplier, currency and day is corrected, any other one added; of two such in
 * one list the later counts.
 * Locks: nothing. Writes: quotes, breaks. Repeat: safe.
 */
export async function writeQuotes(
  tx: Transaction,
  workshopId: string,
  quotes: readonly Quoted[],
): Promise<void> {
  const keyOf = ({ partId, quote }: Quoted) =>
    [partId, quote.supplier, quote.currency, quote.quotedOn].join('\n')
  const last = [...new Map(quotes.map((each) => [keyOf(each), each])).values()]
  for (const some of inChunks(last)) {
    await sequelize.query(
      `delete from quotes q using jsonb_to_recordset($list::jsonb)
         as gone("partId" uuid, supplier text, currency text, "quotedOn" date)
       where q.workshop_id = $workshopId and q.part_id = gone."partId" and q.supplier = gone.supplier
         and q.currency = gone.currency and q.quoted_on = gone."quotedOn"`,
      {
        bind: {
          workshopId,
          list: JSON.stringify(
            some.map(({ partId, quote: { supplier, currency, quotedOn } }) => ({
              ...{ partId, supplier, currency, quotedOn },
            })),
          ),
        },
        type: QueryTypes.DELETE,
        transaction: tx,
      },
    )
    const rows = await Quote.bulkCreate(
      some.map(({ partId, quote: { breaks: _, setupMinor, ...rest } }) => ({
        ...{ workshopId, partId, ...rest },
        setupMinor: minor(setupMinor),
      })),
      { transaction: tx },
    )
    await QuoteBreak.bulkCreate(
      rows.flatMap((row, i) =>
        some[i]!.quote.breaks.map(({ from, unitPrice }) => ({
          ...{ workshopId, quoteId: row.id, fromQuantity: from, unitPrice },
        })),
      ),
      { transaction: tx },
    )
  }
}
