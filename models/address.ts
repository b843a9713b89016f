import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import type { Address as PostAddress, AddressWords } from '@/lib/core/post/address'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, optional, ref, table, text, texts } from './columns'

/** Where something is posted. Only added; erasing blanks it. */
export class Address extends Model<InferAttributes<Address>, InferCreationAttributes<Address>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Whose address it is. */
  declare personId: string
  /** Country, ISO 3166-1 alpha-2. */
  declare country: string
  /** Name on the parcel, in the buyer's own script. Empty once erased. */
  declare name: string
  /** Company, in the buyer's own script. */
  declare organization: string | null
  /** Street lines in the buyer's own script, in order. Empty once erased. */
  declare lines: string[]
  /** Town. */
  declare city: string | null
  /** Province, state or prefecture. */
  declare region: string | null
  /** Postcode as written there. */
  declare postcode: string | null
  /** Telephone for the carrier. */
  declare phone: string | null
  /** Number the destination's customs asks for. */
  declare taxNumber: string | null
  /** Buyer's VAT number, printed on invoices as text. */
  declare vatNumber: string | null
  /** The same in Latin letters where the main fields are not; null otherwise. */
  declare latin: AddressWords | null
  /** SHA-256 of the normalised address, hex: equal for the same place written alike. Random once erased. */
  declare fingerprint: string
  /** When it was given (business time). */
  declare createdAt: Date
  /** When it was blanked; null while readable. */
  declare erasedAt: Date | null

  facts(): PostAddress {
    return {
      country: this.country,
      name: this.name,
      lines: this.lines,
      organization: this.organization ?? undefined,
      city: this.city ?? undefined,
      region: this.region ?? undefined,
      postcode: this.postcode ?? undefined,
      phone: this.phone ?? undefined,
      taxNumber: this.taxNumber ?? undefined,
      latin: this.latin ?? undefined,
    }
  }
}

Address.init(
  {
    id: key(),
    workshopId: ref(),
    personId: ref(),
    country: text(),
    name: text(),
    organization: optional(text()),
    lines: texts(),
    city: optional(text()),
    region: optional(text()),
    postcode: optional(text()),
    phone: optional(text()),
    taxNumber: optional(text()),
    vatNumber: optional(text()),
    latin: optional(json()),
    fingerprint: text(),
    createdAt: moment(),
    erasedAt: optional(moment()),
  },
  table(sequelize, 'Address', 'addresses'),
)
