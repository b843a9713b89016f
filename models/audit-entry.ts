import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { counted, key, moment, optional, ref, table, text } from './columns'

/** Who moved what, when, from where. Ids only; never changed. */
export class AuditEntry extends Model<InferAttributes<AuditEntry>, InferCreationAttributes<AuditEntry>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop it happened in; null if in none. */
  declare workshopId: string | null
  /** Noun of what was moved ('order', 'run', …). */
  declare subjectType: string
  /** Its id. */
  declare subjectId: string
  /** State before; null at creation. */
  declare fromState: string | null
  /** What happened. */
  declare event: string
  /** State after. */
  declare toState: string
  /** Who did it; null when the system did. */
  declare byPersonId: string | null
  /** When (business time). */
  declare at: Date
  /** Reason or detail, without personal data; null if none. */
  declare note: string | null
  /** Order in which entries were written. */
  declare seq: CreationOptional<number>
}

AuditEntry.init(
  {
    id: key(),
    workshopId: optional(ref()),
    subjectType: text(),
    subjectId: ref(),
    fromState: optional(text()),
    event: text(),
    toState: text(),
    byPersonId: optional(ref()),
    at: moment(),
    note: optional(text()),
    seq: counted(),
  },
  table(sequelize, 'AuditEntry', 'audit_entries'),
)
