import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { flag, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { ChoiceAnswer } from './choice-answer'
import type { Offer } from './offer'

/** One question per offer with up to four answers. */
export class Choice extends Model<InferAttributes<Choice>, InferCreationAttributes<Choice>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The offer it is asked for. */
  declare offerId: string
  /** The question ("Front panel finish"). */
  declare question: string
  /** Order among the offer's questions, from 0. */
  declare position: CreationOptional<number>
  /** True: asked only once the run is locked, with the default standing in. */
  declare askedAfterLock: CreationOptional<boolean>
  /** Days after the lock within which it can be answered, where it is asked then. */
  declare answerWithinDays: CreationOptional<number>
  /** Since when it is not asked any more; null while it is. */
  declare retiredAt: Date | null

  declare offer?: NonAttribute<Offer>
  declare answers?: NonAttribute<ChoiceAnswer[]>
}

Choice.init(
  {
    id: key(),
    workshopId: ref(),
    offerId: ref(),
    question: text(),
    position: preset(whole(), 0),
    askedAfterLock: preset(flag(), false),
    answerWithinDays: preset(whole(), 14),
    retiredAt: optional(moment()),
  },
  table(sequelize, 'Choice', 'choices'),
)
