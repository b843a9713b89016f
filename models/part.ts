import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, flag, key, moment, optional, preset, ref, table, text } from './columns'
import type { Quote } from './quote'
import type { RevisionLine } from './revision-line'
import type { StockMove } from './stock-move'
import type { Lifecycle } from './words'

/** One distinct part as a workshop buys it. */
export class Part extends Model<InferAttributes<Part>, InferCreationAttributes<Part>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The workshop's own name for it, unique within it. */
  declare code: string
  /** What it is. */
  declare description: CreationOptional<string>
  /** Who makes it. */
  declare maker: CreationOptional<string>
  /** The maker's order code. */
  declare makerCode: CreationOptional<string>
  /** Value as written in the parts list ("4K7", "100n X7R"). */
  declare value: CreationOptional<string>
  /** Whether it will still be made. */
  declare lifecycle: CreationOptional<Lifecycle>
  /** True: "check a sample first" (what looks right in a catalogue may not be). */
  declare needsSample: CreationOptional<boolean>
  /** When a sample was checked; null while none was. */
  declare sampleCheckedOn: Day | null
  /** Whether it fitted; null while unchecked. */
  declare sampleFits: boolean | null
  /** What was found. */
  declare sampleNote: string | null
  /** Who checked. */
  declare sampleByPersonId: string | null
  /** Where it lies. */
  declare storagePlace: CreationOptional<string>
  /** How it must be turned; empty if it does not matter. */
  declare polarityNote: CreationOptional<string>
  /** When it was entered (business time). */
  declare createdAt: Date

  declare revisionLines?: NonAttribute<RevisionLine[]>
  declare quotes?: NonAttribute<Quote[]>
  declare stockMoves?: NonAttribute<StockMove[]>

  facts() {
    return {
      id: this.id,
      code: this.code,
      value: this.value,
      lifecycle: this.lifecycle,
      needsSample: this.needsSample,
      sampleCheckedOn: this.sampleCheckedOn,
      sampleFits: this.sampleFits,
    }
  }
}

Part.init(
  {
    id: key(),
    workshopId: ref(),
    code: text(),
    description: preset(text(), ''),
    maker: preset(text(), ''),
    makerCode: preset(text(), ''),
    value: preset(text(), ''),
    lifecycle: preset(text(), 'active'),
    needsSample: preset(flag(), false),
    sampleCheckedOn: optional(day()),
    sampleFits: optional(flag()),
    sampleNote: optional(text()),
    sampleByPersonId: optional(ref()),
    storagePlace: preset(text(), ''),
    polarityNote: preset(text(), ''),
    createdAt: moment(),
  },
  table(sequelize, 'Part', 'parts'),
)
