import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, table, text, whole } from './columns'

/** An Idempotency-Key: the same request again gets the same answer. */
export class RequestKey extends Model<InferAttributes<RequestKey>, InferCreationAttributes<RequestKey>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Whose key it is and for which address: the person or visitor, and the path. */
  declare scope: string
  /** The key as sent. */
  declare key: string
  /** SHA-256 of the body, hex; another body under the same key is refused. */
  declare bodyHash: string
  /** HTTP status answered; null while running. */
  declare status: number | null
  /** Body answered; null while running. */
  declare answer: string | null
  /** When it came, or was taken up again (real time); the lease counts from here. */
  declare startedAt: Date
}

RequestKey.init(
  {
    id: key(),
    scope: text(),
    key: text(),
    bodyHash: text(),
    status: optional(whole()),
    answer: optional(text()),
    startedAt: moment(),
  },
  table(sequelize, 'RequestKey', 'request_keys'),
)
