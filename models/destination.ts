import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, flag, key, optional, preset, ref, table, text } from './columns'
import type { DestinationState, DutiesMode } from './words'

/** Whether an offer is posted to a country, and on which terms. */
export class Destination extends Model<InferAttributes<Destination>, InferCreationAttributes<Destination>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The offer. */
  declare offerId: string
  /** Where to, ISO 3166-1 alpha-2. */
  declare country: string
  /** Posted to; never; not at present. */
  declare state: CreationOptional<DestinationState>
  /** Why it is closed or paused, shown to the buyer; null while open. */
  declare reason: string | null
  /** Who pays duties on arrival: nobody; the buyer; the workshop beforehand; not posted where any fall due. */
  declare duties: CreationOptional<DutiesMode>
  /** True: the post there wants a telephone number. */
  declare asksPhone: CreationOptional<boolean>
  /** True: customs there wants a tax number. */
  declare asksTaxNumber: CreationOptional<boolean>
  /** What may follow on arrival, shown before the deposit. */
  declare note: CreationOptional<string>
  /** Day the note was last checked; null if it never was. */
  declare noteOn: Day | null

  facts() {
    return {
      country: this.country,
      state: this.state,
      reason: this.reason,
      duties: this.duties,
      asksPhone: this.asksPhone,
      asksTaxNumber: this.asksTaxNumber,
    }
  }
}

Destination.init(
  {
    id: key(),
    workshopId: ref(),
    offerId: ref(),
    country: text(),
    state: preset(text(), 'open'),
    reason: optional(text()),
    duties: preset(text(), 'none'),
    asksPhone: preset(flag(), false),
    asksTaxNumber: preset(flag(), false),
    note: preset(text(), ''),
    noteOn: optional(day()),
  },
  table(sequelize, 'Destination', 'destinations'),
)
