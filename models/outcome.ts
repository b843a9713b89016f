import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, ref, table, text, whole } from './columns'
import type { OutcomeClass } from './words'

/** How a class of people turned out in a closed run: the history conversions learn from. */
export class Outcome extends Model<InferAttributes<Outcome>, InferCreationAttributes<Outcome>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The run. */
  declare runId: string
  /** Which class: by certainty, sign-ups over 90 days old, deposit holders paying their balance. */
  declare className: OutcomeClass
  /** People of it who ordered (or paid). */
  declare converted: number
  /** People of it who did not. */
  declare notConverted: number
  /** When the run closed (business time). */
  declare storedAt: Date

  facts() {
    return { className: this.className, converted: this.converted, notConverted: this.notConverted }
  }
}

Outcome.init(
  {
    id: key(),
    workshopId: ref(),
    runId: ref(),
    className: text(),
    converted: whole(),
    notConverted: whole(),
    storedAt: moment(),
  },
  table(sequelize, 'Outcome', 'outcomes'),
)
