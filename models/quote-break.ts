import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { decimal, key, ref, table, whole } from './columns'

/** The price of one from a quantity on. */
export class QuoteBreak extends Model<InferAttributes<QuoteBreak>, InferCreationAttributes<QuoteBreak>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The quote. */
  declare quoteId: string
  /** From this many on, for the whole purchase. */
  declare fromQuantity: number
  /** Price of one in minor units of the quote's currency, a decimal string. */
  declare unitPrice: string
}

QuoteBreak.init(
  {
    id: key(),
    workshopId: ref(),
    quoteId: ref(),
    fromQuantity: whole(),
    unitPrice: decimal(18, 6),
  },
  table(sequelize, 'QuoteBreak', 'quote_breaks'),
)
