import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { flag, key, moment, preset, ref, table, text, whole } from './columns'

/** The terms as they stood when someone ordered; never edited, only followed by a next version. */
export class TermsVersion extends Model<
  InferAttributes<TermsVersion>,
  InferCreationAttributes<TermsVersion>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Counts up from 1 within the workshop. */
  declare number: number
  /** The terms, plain text. */
  declare body: string
  /** Whether these terms let a lapsed order's deposit be kept. */
  declare lapseKeepsDeposit: CreationOptional<boolean>
  /** From when orders are placed under it (business time). */
  declare publishedAt: Date
  /** Who published it. */
  declare publishedByPersonId: string
}

TermsVersion.init(
  {
    id: key(),
    workshopId: ref(),
    number: whole(),
    body: text(),
    lapseKeepsDeposit: preset(flag(), false),
    publishedAt: moment(),
    publishedByPersonId: ref(),
  },
  table(sequelize, 'TermsVersion', 'terms_versions'),
)
