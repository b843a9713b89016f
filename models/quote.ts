import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day, Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, key, money, optional, preset, ref, table, text, whole } from './columns'
import type { Part } from './part'
import type { QuoteBreak } from './quote-break'

/** What a supplier asks for a part. */
export class Quote extends Model<InferAttributes<Quote>, InferCreationAttributes<Quote>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The part. */
  declare partId: string
  /** Who sells it. */
  declare supplier: string
  /** The supplier's order code. */
  declare supplierCode: CreationOptional<string>
  /** Currency of the prices. */
  declare currency: string
  /** Least quantity sold. */
  declare moq: CreationOptional<number>
  /** Quantities are multiples of this. */
  declare multiple: CreationOptional<number>
  /** Fixed cost per purchase, minor units of the quote's currency. */
  declare setupMinor: CreationOptional<Minor>
  /** Days until it arrives; null if unknown. */
  declare leadDays: number | null
  /** Day of the quote. */
  declare quotedOn: Day
  /** Pieces the supplier had; null if not looked at. */
  declare stockSeen: number | null
  /** Day that was seen. */
  declare stockSeenOn: Day | null

  declare part?: NonAttribute<Part>
  declare breaks?: NonAttribute<QuoteBreak[]>

  facts() {
    return {
      id: this.id,
      partId: this.partId,
      supplier: this.supplier,
      currency: this.currency,
      moq: this.moq,
      multiple: this.multiple,
      setupMinor: this.setupMinor,
      leadDays: this.leadDays,
      quotedOn: this.quotedOn,
      stockSeen: this.stockSeen,
      stockSeenOn: this.stockSeenOn,
    }
  }
}

Quote.init(
  {
    id: key(),
    workshopId: ref(),
    partId: ref(),
    supplier: text(),
    supplierCode: preset(text(), ''),
    currency: text(),
    moq: preset(whole(), 1),
    multiple: preset(whole(), 1),
    setupMinor: preset(money(), 0),
    leadDays: optional(whole()),
    quotedOn: day(),
    stockSeen: optional(whole()),
    stockSeenOn: optional(day()),
  },
  table(sequelize, 'Quote', 'quotes'),
)
