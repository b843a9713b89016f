import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { UnitState } from '@/lib/core/states/unit'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text } from './columns'
import type { OrderLine } from './order-line'
import type { ParcelLine } from './parcel-line'
import type { Revision } from './revision'
import type { OfferKind } from './words'

/** One physical piece with a serial number. */
export class Unit extends Model<InferAttributes<Unit>, InferCreationAttributes<Unit>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The revision it is built to. */
  declare revisionId: string
  /** The run it is built for; null for a first unit of a revision. */
  declare runId: string | null
  /** Form it is sold in. */
  declare offerKind: CreationOptional<OfferKind>
  /** Serial number, unique within the workshop. */
  declare serial: string
  /** Where it stands (states.md, unit). */
  declare state: CreationOptional<UnitState>
  /** The line it is allocated to; null while free. */
  declare orderLineId: string | null
  /** When work on it began (business time). */
  declare startedAt: Date
  /** When it last passed its test plan; null while it has not. */
  declare passedAt: Date | null
  /** When it was given up; null while it was not. */
  declare scrappedAt: Date | null
  /** What the bench wrote about it. */
  declare note: CreationOptional<string>

  declare parcelLines?: NonAttribute<ParcelLine[]>
  declare orderLine?: NonAttribute<OrderLine>
  declare revision?: NonAttribute<Revision>

  facts() {
    return {
      id: this.id,
      revisionId: this.revisionId,
      runId: this.runId,
      offerKind: this.offerKind,
      serial: this.serial,
      state: this.state,
      orderLineId: this.orderLineId,
    }
  }
}

Unit.init(
  {
    id: key(),
    workshopId: ref(),
    revisionId: ref(),
    runId: optional(ref()),
    offerKind: preset(text(), 'built'),
    serial: text(),
    state: preset(text(), 'started'),
    orderLineId: optional(ref()),
    startedAt: moment(),
    passedAt: optional(moment()),
    scrappedAt: optional(moment()),
    note: preset(text(), ''),
  },
  table(sequelize, 'Unit', 'units'),
)
