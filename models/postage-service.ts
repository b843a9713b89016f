import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Minor } from '@/lib/core/brand'
import type { PostService } from '@/lib/core/post/postage'
import { sequelize } from '@/lib/db/sequelize'
import { flag, json, key, moment, money, optional, preset, ref, table, text, whole } from './columns'
import type { PostageBand } from './json'
import type { PostageZone } from './postage-zone'
import type { PostageKind } from './words'

/** One way of posting to a zone, with its price bands by weight. */
export class PostageService extends Model<
  InferAttributes<PostageService>,
  InferCreationAttributes<PostageService>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The zone it serves. */
  declare zoneId: string
  /** Name of the service as the buyer reads it. */
  declare name: string
  /** Form of posting, which decides the customs form. */
  declare kind: CreationOptional<PostageKind>
  /** Heaviest it takes, in grams, inclusive. */
  declare maxGrams: number
  /** Longest side it takes, in millimetres, inclusive. */
  declare maxMm: number
  /** Prices by weight, rising: {upTo: grams, inclusive; priceMinor}. */
  declare bands: PostageBand[]
  /** Whether a tracking number comes with it. */
  declare tracked: CreationOptional<boolean>
  /** Value it insures, minor units of the workshop's currency. */
  declare insuredMinor: CreationOptional<Minor>
  /** Days after posting within which a loss must be claimed; null if it cannot be. */
  declare claimWithinDays: number | null
  /** Address of the carrier's page, {tracking} standing for the number; null if none. */
  declare trackingUrl: string | null
  /** Order within the zone, from 0; the earlier wins at equal price. */
  declare position: CreationOptional<number>
  /** Since when it is not offered any more; null while it is. */
  declare endedAt: Date | null

  declare zone?: NonAttribute<PostageZone>

  facts(): PostService {
    return {
      id: this.id,
      maxGrams: this.maxGrams,
      maxMm: this.maxMm,
      bands: this.bands.map(({ upTo, priceMinor }) => ({ upTo, price: priceMinor })),
    }
  }
}

PostageService.init(
  {
    id: key(),
    workshopId: ref(),
    zoneId: ref(),
    name: text(),
    kind: preset(text(), 'parcel'),
    maxGrams: whole(),
    maxMm: whole(),
    bands: json(),
    tracked: preset(flag(), true),
    insuredMinor: preset(money(), 0),
    claimWithinDays: optional(whole()),
    trackingUrl: optional(text()),
    position: preset(whole(), 0),
    endedAt: optional(moment()),
  },
  table(sequelize, 'PostageService', 'postage_services'),
)
