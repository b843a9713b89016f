import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day, Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { Offer } from './offer'
import type { OrderLine } from './order-line'
import type { Run } from './run'
import type { OfferKind, TaxClass } from './words'

/** An offer as a run sells it: the snapshot of its price and its promised date. */
export class RunOffer extends Model<InferAttributes<RunOffer>, InferCreationAttributes<RunOffer>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** The offer it was copied from. */
  declare offerId: string
  /** Its form, copied. */
  declare kind: OfferKind
  /** Price of one, minor units of the run's currency, with tax when the workshop's prices include it. */
  declare priceMinor: Minor
  /** Part of it paid as deposit. */
  declare depositMinor: Minor
  /** Class of goods, copied. */
  declare taxClass: CreationOptional<TaxClass>
  /** Promised day: last parcel of this offer handed to the post. */
  declare postedByOn: Day
  /** The day promised at opening. */
  declare postedByFirstOn: Day
  /** Units of this offer at most; null if only the run limits it. */
  declare maximum: number | null
  /** Units of it taken and held, changed under the run's lock. */
  declare committedUnits: CreationOptional<number>
  /** When a delay notice last went out; null if none did. */
  declare delayedAt: Date | null

  declare run?: NonAttribute<Run>
  declare offer?: NonAttribute<Offer>
  declare lines?: NonAttribute<OrderLine[]>

  facts() {
    return {
      id: this.id,
      offerId: this.offerId,
      kind: this.kind,
      priceMinor: this.priceMinor,
      depositMinor: this.depositMinor,
      taxClass: this.taxClass,
      postedByOn: this.postedByOn,
      maximum: this.maximum,
      committedUnits: this.committedUnits,
    }
  }
}

RunOffer.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    offerId: ref(),
    kind: text(),
    priceMinor: money(),
    depositMinor: money(),
    taxClass: preset(text(), 'standard'),
    postedByOn: day(),
    postedByFirstOn: day(),
    maximum: optional(whole()),
    committedUnits: preset(whole(), 0),
    delayedAt: optional(moment()),
  },
  table(sequelize, 'RunOffer', 'run_offers'),
)
