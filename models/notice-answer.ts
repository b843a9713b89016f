import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, key, moment, optional, ref, table, text } from './columns'
import type { Notice } from './notice'
import type { Order } from './order'
import type { NoticeChoice } from './words'

/** What one order answers to a notice, or what silence will mean. */
export class NoticeAnswer extends Model<
  InferAttributes<NoticeAnswer>,
  InferCreationAttributes<NoticeAnswer>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The notice. */
  declare noticeId: string
  /** The order. */
  declare orderId: string
  /** What happens without an answer, by the buyer's country. */
  declare silenceMeans: NoticeChoice
  /** Last day to answer, in the workshop's zone. */
  declare answerByOn: Day
  /** The instant that day ends there. */
  declare answerByAt: Date
  /** Day by which money must be back should it be cancelled; null where no rule says. */
  declare refundByOn: Day | null
  /** SHA-256 of the token in the mail's link, hex; null where only the account answers. */
  declare tokenHash: string | null
  /** What was answered; null while silent. */
  declare answer: NoticeChoice | null
  /** When. */
  declare answeredAt: Date | null
  /** When the answer or the silence had taken effect; null before. */
  declare settledAt: Date | null

  declare order?: NonAttribute<Order>
  declare notice?: NonAttribute<Notice>
}

NoticeAnswer.init(
  {
    id: key(),
    workshopId: ref(),
    noticeId: ref(),
    orderId: ref(),
    silenceMeans: text(),
    answerByOn: day(),
    answerByAt: moment(),
    refundByOn: optional(day()),
    tokenHash: optional(text()),
    answer: optional(text()),
    answeredAt: optional(moment()),
    settledAt: optional(moment()),
  },
  table(sequelize, 'NoticeAnswer', 'notice_answers'),
)
