import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { MailState } from '@/lib/core/states/mail'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { Person } from './person'
import type { Workshop } from './workshop'

/** One mail, written in the transaction that caused it and sent by the worker. */
export class MailOutbox extends Model<InferAttributes<MailOutbox>, InferCreationAttributes<MailOutbox>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Workshop in whose name it goes; null for the platform's own. */
  declare workshopId: string | null
  /** Which mail (lib/contracts/mails). */
  declare kind: string
  /** To whom; the address is read when it is sent. */
  declare personId: string
  /** Id of what it is about. */
  declare subjectId: string
  /** 1, 2, …: the same mail about the same thing goes once per version. */
  declare version: CreationOptional<number>
  /** Message-ID header, the same for every try. */
  declare messageId: string
  /** Facts it is rendered from: ids, sums, days. */
  declare props: Record<string, unknown>
  /** Raw tokens of its links; removed once it was sent. */
  declare secrets: Record<string, string> | null
  /** Where it stands (states.md, mail). */
  declare state: CreationOptional<MailState>
  /** Subject as sent; null before, and once erased. */
  declare subjectLine: string | null
  /** Plain text as sent; null before, and once erased. */
  declare bodyText: string | null
  /** HTML as sent; null before, and once erased. */
  declare bodyHtml: string | null
  /** Tries so far. */
  declare attempts: CreationOptional<number>
  /** What the server said last; null if nothing went wrong. */
  declare lastError: string | null
  /** When it was queued (business time). */
  declare queuedAt: Date
  /** When a worker last took it (real time); null while none has. */
  declare claimedAt: Date | null
  /** When the server took it (business time). */
  declare sentAt: Date | null
  /** When it was given up, dropped or bounced. */
  declare endedAt: Date | null

  declare person?: NonAttribute<Person>
  declare workshop?: NonAttribute<Workshop>
}

MailOutbox.init(
  {
    id: key(),
    workshopId: optional(ref()),
    kind: text(),
    personId: ref(),
    subjectId: text(),
    version: preset(whole(), 1),
    messageId: text(),
    props: json(),
    secrets: optional(json()),
    state: preset(text(), 'queued'),
    subjectLine: optional(text()),
    bodyText: optional(text()),
    bodyHtml: optional(text()),
    attempts: preset(whole(), 0),
    lastError: optional(text()),
    queuedAt: moment(),
    claimedAt: optional(moment()),
    sentAt: optional(moment()),
    endedAt: optional(moment()),
  },
  table(sequelize, 'MailOutbox', 'mail_outbox'),
)
