import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, ref, table, text } from './columns'
import type { User } from './user'

/** One signed-in browser; deleting the row signs it out. */
export class Session extends Model<InferAttributes<Session>, InferCreationAttributes<Session>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Who is signed in. */
  declare userId: string
  /** SHA-256 of the cookie's token, hex; the token itself is never stored. */
  declare tokenHash: string
  /** When the browser signed in. */
  declare createdAt: Date
  /** When the session ends by itself. */
  declare expiresAt: Date
  /** When it was last used, to the minute; null before the second request. */
  declare lastSeenAt: Date | null
  /** When a second-factor code was last given in this session; null if never. */
  declare secondFactorAt: Date | null
  /** Short description of the browser, shown in the list of sessions. */
  declare device: string | null

  declare user?: NonAttribute<User>
}

Session.init(
  {
    id: key(),
    userId: ref(),
    tokenHash: text(),
    createdAt: moment(),
    expiresAt: moment(),
    lastSeenAt: optional(moment()),
    secondFactorAt: optional(moment()),
    device: optional(text()),
  },
  table(sequelize, 'Session', 'sessions'),
)
