import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { LotState } from '@/lib/core/states/lot'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { SamplingRecord } from './json'

/** Pieces that came in together and are judged together. */
export class Lot extends Model<InferAttributes<Lot>, InferCreationAttributes<Lot>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** What they were bought as; null for gifts and finds. */
  declare purchaseLineId: string | null
  /** The part; null for boards and front panels. */
  declare partId: string | null
  /** Counts up from 1 within the workshop. */
  declare number: number
  /** Pieces that came. */
  declare quantity: number
  /** Where it stands (states.md, lot). */
  declare state: CreationOptional<LotState>
  /** Plan it is judged by and what was found; null while not looked at. */
  declare sampling: SamplingRecord | null
  /** Good pieces after judging or sorting; null before. */
  declare acceptedCount: number | null
  /** Why it was waived or sent back; null where none was needed. */
  declare reason: string | null
  /** When it came (business time). */
  declare receivedAt: Date
  /** When it was judged; null while it was not. */
  declare judgedAt: Date | null
}

Lot.init(
  {
    id: key(),
    workshopId: ref(),
    purchaseLineId: optional(ref()),
    partId: optional(ref()),
    number: whole(),
    quantity: whole(),
    state: preset(text(), 'received'),
    sampling: optional(json()),
    acceptedCount: optional(whole()),
    reason: optional(text()),
    receivedAt: moment(),
    judgedAt: optional(moment()),
  },
  table(sequelize, 'Lot', 'lots'),
)
