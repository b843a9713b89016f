import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Day } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { day, key, optional, preset, ref, table, text, whole } from './columns'
import type { TaxClass } from './words'

/** Rate of tax by country and class from a day on. */
export class TaxRate extends Model<InferAttributes<TaxRate>, InferCreationAttributes<TaxRate>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Workshop whose own rate this is; null for the reference everyone starts with. */
  declare workshopId: string | null
  /** Country whose tax it is, ISO 3166-1 alpha-2. */
  declare country: string
  /** Class of goods. */
  declare taxClass: CreationOptional<TaxClass>
  /** Rate in hundredths of a percent: 1900 is 19 %. */
  declare basisPoints: number
  /** First day on which it holds. */
  declare validFrom: Day
  /** Where the rate was read and when. */
  declare source: CreationOptional<string>

  facts() {
    return {
      country: this.country,
      taxClass: this.taxClass,
      basisPoints: this.basisPoints,
      validFrom: this.validFrom,
    }
  }
}

TaxRate.init(
  {
    id: key(),
    workshopId: optional(ref()),
    country: text(),
    taxClass: preset(text(), 'standard'),
    basisPoints: whole(),
    validFrom: day(),
    source: preset(text(), ''),
  },
  table(sequelize, 'TaxRate', 'tax_rates'),
)
