import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day } from '@/lib/core/brand'
import type { ProblemState } from '@/lib/core/states/problem'
import { sequelize } from '@/lib/db/sequelize'
import { day, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { Order } from './order'
import type { ProblemKind, Remedy } from './words'

/** Something wrong after posting. */
export class Problem extends Model<InferAttributes<Problem>, InferCreationAttributes<Problem>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Counts up from 1 within the workshop. */
  declare number: number
  /** The order. */
  declare orderId: string
  /** The line; null for the whole parcel. */
  declare orderLineId: string | null
  /** The parcel; null if not named. */
  declare parcelId: string | null
  /** What is wrong. */
  declare kind: ProblemKind
  /** What happened, in the buyer's words. Emptied on erasure. */
  declare story: string
  /** Where it stands (states.md, problem). */
  declare state: CreationOptional<ProblemState>
  /** What was offered; message: an answer alone. Null while open. */
  declare remedy: Remedy | null
  /** What was answered; null while open. */
  declare answer: string | null
  /** The lesson it led to; null if none. */
  declare lessonId: string | null
  /** When it was reported (business time). */
  declare openedAt: Date
  /** Day by which the buyer hears, shown to them. */
  declare answerByOn: Day
  /** When it was answered. */
  declare answeredAt: Date | null
  /** When it was closed; null while it is not. */
  declare closedAt: Date | null

  declare order?: NonAttribute<Order>
}

Problem.init(
  {
    id: key(),
    workshopId: ref(),
    number: whole(),
    orderId: ref(),
    orderLineId: optional(ref()),
    parcelId: optional(ref()),
    kind: text(),
    story: text(),
    state: preset(text(), 'open'),
    remedy: optional(text()),
    answer: optional(text()),
    lessonId: optional(ref()),
    openedAt: moment(),
    answerByOn: day(),
    answeredAt: optional(moment()),
    closedAt: optional(moment()),
  },
  table(sequelize, 'Problem', 'problems'),
)
