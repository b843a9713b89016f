import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Day, Minor } from '@/lib/core/brand'
import type { PurchaseLineState } from '@/lib/core/states/purchase-line'
import { sequelize } from '@/lib/db/sequelize'
import { day, decimal, flag, key, moment, money, optional, preset, ref, table, text, whole } from './columns'

/** Something bought for a run or for stock. */
export class PurchaseLine extends Model<
  InferAttributes<PurchaseLine>,
  InferCreationAttributes<PurchaseLine>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run; null for stock. */
  declare runId: string | null
  /** The part; null for boards, front panels and the like. */
  declare partId: string | null
  /** What is bought, as on the order. */
  declare name: string
  /** From whom. */
  declare supplier: string
  /** How many. */
  declare quantity: number
  /** How many have come. */
  declare receivedCount: CreationOptional<number>
  /** Price of one in minor units of its currency, a decimal string. */
  declare unitPrice: string
  /** Currency it is bought in. */
  declare currency: string
  /** Cost of the line, minor units of that currency. */
  declare costMinor: Minor
  /** Units of the workshop's currency for one of it, a decimal string; null when the same. */
  declare rate: string | null
  /** Day of the rate. */
  declare rateOn: Day | null
  /** Bought before the lock: counted in the cost of calling off. */
  declare isAtRisk: CreationOptional<boolean>
  /** Where it stands (states.md, purchase line). */
  declare state: CreationOptional<PurchaseLineState>
  /** When it was planned (business time). */
  declare plannedAt: Date
  /** When it was ordered. */
  declare orderedAt: Date | null
  /** When it should come. */
  declare dueOn: Day | null
  /** When it was complete, closed short or cancelled. */
  declare endedAt: Date | null
}

PurchaseLine.init(
  {
    id: key(),
    workshopId: ref(),
    runId: optional(ref()),
    partId: optional(ref()),
    name: text(),
    supplier: text(),
    quantity: whole(),
    receivedCount: preset(whole(), 0),
    unitPrice: decimal(18, 6),
    currency: text(),
    costMinor: money(),
    rate: optional(decimal(18, 9)),
    rateOn: optional(day()),
    isAtRisk: preset(flag(), false),
    state: preset(text(), 'planned'),
    plannedAt: moment(),
    orderedAt: optional(moment()),
    dueOn: optional(day()),
    endedAt: optional(moment()),
  },
  table(sequelize, 'PurchaseLine', 'purchase_lines'),
)
