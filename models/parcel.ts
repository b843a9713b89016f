import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day, Minor } from '@/lib/core/brand'
import type { ParcelState } from '@/lib/core/states/parcel'
import { sequelize } from '@/lib/db/sequelize'
import { day, key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { Address } from './address'
import type { PackBatch } from './pack-batch'
import type { ParcelLine } from './parcel-line'
import type { Person } from './person'
import type { PostageService } from './postage-service'
import type { Run } from './run'
import type { CustomsForm, TrackingKind } from './words'

/** What is posted, with weight, size, papers and tracking. */
export class Parcel extends Model<InferAttributes<Parcel>, InferCreationAttributes<Parcel>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Counts up from 1 within the workshop; printed on the slip. */
  declare number: number
  /** The run; null for a parcel that belongs to none. */
  declare runId: string | null
  /** Whose parcel it is. */
  declare personId: string
  /** Where it goes: the address as it was when it was opened or last changed. */
  declare addressId: string
  /** The batch it is packed in; null while in none. */
  declare batchId: string | null
  /** The problem it answers, for a replacement; null otherwise. */
  declare problemId: string | null
  /** Where it stands (states.md, parcel). */
  declare state: CreationOptional<ParcelState>
  /** The service it goes by; null until chosen. */
  declare serviceId: string | null
  /** Its name as it was at hand-over; null before. */
  declare serviceName: string | null
  /** Tracking number without spaces, upper case; null without one. */
  declare tracking: string | null
  /** Whether the number was verified as S10 or cannot be verified. */
  declare trackingKind: TrackingKind | null
  /** Weight on the scale, grams; null until weighed. */
  declare grams: number | null
  /** Length packed, millimetres. */
  declare lengthMm: number | null
  /** Width packed, millimetres. */
  declare widthMm: number | null
  /** Height packed, millimetres. */
  declare heightMm: number | null
  /** Weight the lines should have together, grams; null while unknown. */
  declare expectedGrams: number | null
  /** When the packer said that a surprising weight is right; null otherwise. */
  declare weightConfirmedAt: Date | null
  /** Form that goes with it; null until decided. */
  declare customsForm: CustomsForm | null
  /** Value declared to customs, minor units; never 0 for a replacement. */
  declare declaredMinor: Minor | null
  /** Currency of the declared value. */
  declare currency: string
  /** Why it must not be packed now; null when it may. */
  declare onHoldReason: string | null
  /** When it entered the queue (business time). */
  declare openedAt: Date
  /** When its papers were last printed; null while never. */
  declare printedAt: Date | null
  /** When a printed label became wrong (changed address); null while right. */
  declare labelVoidAt: Date | null
  /** When it was packed; null while open. */
  declare packedAt: Date | null
  /** Who packed it. */
  declare packedByPersonId: string | null
  /** When it was handed to the post. */
  declare handedOverAt: Date | null
  /** Who handed it over. */
  declare handedOverByPersonId: string | null
  /** Last day to claim a loss from the post; null if it cannot be. */
  declare claimByOn: Day | null
  /** When it arrived, as far as known. */
  declare deliveredAt: Date | null
  /** When it was given up as lost. */
  declare lostAt: Date | null
  /** When it came back. */
  declare returnedAt: Date | null
  /** When the unsent parcel was taken apart. */
  declare discardedAt: Date | null

  declare lines?: NonAttribute<ParcelLine[]>
  declare person?: NonAttribute<Person>
  declare address?: NonAttribute<Address>
  declare run?: NonAttribute<Run>
  declare service?: NonAttribute<PostageService>
  declare batch?: NonAttribute<PackBatch>

  facts() {
    return {
      id: this.id,
      number: this.number,
      runId: this.runId,
      addressId: this.addressId,
      state: this.state,
      grams: this.grams,
      lengthMm: this.lengthMm,
      widthMm: this.widthMm,
      heightMm: this.heightMm,
      expectedGrams: this.expectedGrams,
      weightConfirmedAt: this.weightConfirmedAt,
      onHoldReason: this.onHoldReason,
      labelVoidAt: this.labelVoidAt,
    }
  }
}

Parcel.init(
  {
    id: key(),
    workshopId: ref(),
    number: whole(),
    runId: optional(ref()),
    personId: ref(),
    addressId: ref(),
    batchId: optional(ref()),
    problemId: optional(ref()),
    state: preset(text(), 'open'),
    serviceId: optional(ref()),
    serviceName: optional(text()),
    tracking: optional(text()),
    trackingKind: optional(text()),
    grams: optional(whole()),
    lengthMm: optional(whole()),
    widthMm: optional(whole()),
    heightMm: optional(whole()),
    expectedGrams: optional(whole()),
    weightConfirmedAt: optional(moment()),
    customsForm: optional(text()),
    declaredMinor: optional(money()),
    currency: text(),
    onHoldReason: optional(text()),
    openedAt: moment(),
    printedAt: optional(moment()),
    labelVoidAt: optional(moment()),
    packedAt: optional(moment()),
    packedByPersonId: optional(ref()),
    handedOverAt: optional(moment()),
    handedOverByPersonId: optional(ref()),
    claimByOn: optional(day()),
    deliveredAt: optional(moment()),
    lostAt: optional(moment()),
    returnedAt: optional(moment()),
    discardedAt: optional(moment()),
  },
  table(sequelize, 'Parcel', 'parcels'),
)
