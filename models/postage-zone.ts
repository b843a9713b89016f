import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, preset, ref, table, text, texts, whole } from './columns'
import type { PostageService } from './postage-service'

/** Countries that cost the same to post to. */
export class PostageZone extends Model<InferAttributes<PostageZone>, InferCreationAttributes<PostageZone>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Name the owner gave it. */
  declare name: string
  /** ISO 3166-1 alpha-2 codes, or '*' alone for every country no other zone names. */
  declare countries: string[]
  /** Order among the workshop's zones, from 0. */
  declare position: CreationOptional<number>

  declare services?: NonAttribute<PostageService[]>
}

PostageZone.init(
  {
    id: key(),
    workshopId: ref(),
    name: text(),
    countries: texts(),
    position: preset(whole(), 0),
  },
  table(sequelize, 'PostageZone', 'postage_zones'),
)
