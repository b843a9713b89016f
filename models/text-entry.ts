import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, ref, table, text } from './columns'

/** A text of a workshop in one further language. */
export class TextEntry extends Model<InferAttributes<TextEntry>, InferCreationAttributes<TextEntry>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Noun of what it describes. */
  declare subjectType: string
  /** Its id. */
  declare subjectId: string
  /** Which of its texts. */
  declare field: string
  /** BCP 47 tag of the language. */
  declare locale: string
  /** The text. */
  declare body: string
}

TextEntry.init(
  {
    id: key(),
    workshopId: ref(),
    subjectType: text(),
    subjectId: ref(),
    field: text(),
    locale: text(),
    body: text(),
  },
  table(sequelize, 'TextEntry', 'texts'),
)
