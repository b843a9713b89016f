import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, optional, table, text } from './columns'

/** What the provider told us, as it came in; applied by a job. */
export class ProviderEvent extends Model<
  InferAttributes<ProviderEvent>,
  InferCreationAttributes<ProviderEvent>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Connected account it concerns; empty for the platform's own. */
  declare account: string
  /** The provider's id of the event. */
  declare eventId: string
  /** The provider's name of what happened. */
  declare type: string
  /** The provider's id of what it happened to. */
  declare objectId: string
  /** The event as sent; cut after 90 days. */
  declare payload: Record<string, unknown> | null
  /** When it came in (real time). */
  declare receivedAt: Date
  /** When the provider says it happened. */
  declare providerCreatedAt: Date
  /** When it had been applied, or found to be none of ours; null while waiting. */
  declare appliedAt: Date | null
  /** What applying it did, in a word; null while waiting. */
  declare outcome: string | null
  /** When the payload was cut; null while kept. */
  declare payloadCutAt: Date | null
}

ProviderEvent.init(
  {
    id: key(),
    account: text(),
    eventId: text(),
    type: text(),
    objectId: text(),
    payload: optional(json()),
    receivedAt: moment(),
    providerCreatedAt: moment(),
    appliedAt: optional(moment()),
    outcome: optional(text()),
    payloadCutAt: optional(moment()),
  },
  table(sequelize, 'ProviderEvent', 'provider_events'),
)
