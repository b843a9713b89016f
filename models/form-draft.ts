import { type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { json, moment, table, text, textKey } from './columns'

/** What someone typed into a form sent without JavaScript and refused; kept 15 minutes, no card data. */
export class FormDraft extends Model<InferAttributes<FormDraft>, InferCreationAttributes<FormDraft>> {
  /** Random, 32 characters: whoever knows it sees the draft. */
  declare id: string
  /** Which form. */
  declare form: string
  /** What was typed, by field. */
  declare values: Record<string, string>
  /** The refusal. */
  declare reason: string
  /** Sentence per field. */
  declare errors: Record<string, string>
  /** When it may be deleted (real time). */
  declare expiresAt: Date
}

FormDraft.init(
  {
    id: textKey(),
    form: text(),
    values: json(),
    reason: text(),
    errors: json(),
    expiresAt: moment(),
  },
  table(sequelize, 'FormDraft', 'form_drafts'),
)
