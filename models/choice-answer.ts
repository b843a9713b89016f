import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { flag, key, money, preset, ref, table, text, whole } from './columns'
import type { Choice } from './choice'

/** One possible answer to a choice. */
export class ChoiceAnswer extends Model<
  InferAttributes<ChoiceAnswer>,
  InferCreationAttributes<ChoiceAnswer>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The question. */
  declare choiceId: string
  /** The answer as shown. */
  declare label: string
  /** Added to the price of one, minor units of the workshop's currency. */
  declare surchargeMinor: CreationOptional<Minor>
  /** Place among the answers, 1–4. */
  declare position: number
  /** Stands in where nothing was answered; at most one per question. */
  declare isDefault: CreationOptional<boolean>

  declare choice?: NonAttribute<Choice>
}

ChoiceAnswer.init(
  {
    id: key(),
    workshopId: ref(),
    choiceId: ref(),
    label: text(),
    surchargeMinor: preset(money(), 0),
    position: whole(),
    isDefault: preset(flag(), false),
  },
  table(sequelize, 'ChoiceAnswer', 'choice_answers'),
)
