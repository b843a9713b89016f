import 'server-only'
import { randomUUID } from 'node:crypto'
import { QueryTypes, type Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { MAILS, SECRET_LINKS, type MailKind, type MailProps } from '@/lib/contracts/mails'
import { sequelize } from '@/lib/db/sequelize'
import { enqueue } from '@/lib/jobs/enqueue'
import { recordMove } from '@/lib/services/_steps/record-move'

type QueuedMail<K extends MailKind> = {
  kind: K
  workshopId: string | null
  personId: string
  /** What there is one of per receiver (lib/contracts/mails says which, per kind). */
  subjectId: string
  version?: number
  props: MailProps<K>
  now: Date
}

/**
 * Promises a mail in the transaction of what it tells about: both happen or neither. True when it is new.
 * Throws for facts that are not the kind's: that is a bug of the caller. Locks: nothing. Writes: one outbox row, one
 * audit entry, one job. Repeat: safe; a mail of the same kind, subject and version exists once.
 */
export async function queueMail<K extends MailKind>(tx: Transaction, mail: QueuedMail<K>): Promise<boolean> {
  const { kind, subjectId, version = 1, now } = mail
  if (!/^[\w.-]{1,100}$/.test(subjectId))
    throw new RangeError(`queueMail: subjectId must be an id, got ${subjectId}`)
  const { props, secrets } = apart(kind, MAILS[kind].parse(mail.props) as MailProps<K>)
  const id = randomUUID()
  const inserted = await sequelize.query(
    `insert into mail_outbox (id, workshop_id, kind, person_id, subject_id, version, message_id, props, secrets, queued_at)
     values ($id, $workshopId, $kind, $personId, $subjectId, $version, $messageId, $props, $secrets, $now)
     on conflict (kind, subject_id, version) do nothing returning id`,
    {
      bind: {
        id,
        workshopId: mail.workshopId,
        kind,
        personId: mail.personId,
        subjectId,
        version,
        messageId: `<${kind}.${subjectId}.${version}@${new URL(env().BASE_URL).hostname}>`,
        props: JSON.stringify(props),
        secrets: secrets && JSON.stringify(secrets),
        now: now.toISOString(),
      },
      type: QueryTypes.SELECT,
      transaction: tx,
    },
  )
  if (inserted.length === 0) return false
  await recordMove(tx, {
    workshopId: mail.workshopId,
    subjectType: 'mail',
    subjectId: id,
    from: null,
    event: 'queue',
    to: 'queued',
    byPersonId: null,
    at: now,
  })
  await enqueue(tx, 'send_mail', { mailId: id })
  return true
}

/** Links that act for whoever holds them are kept apart, to be forgotten once the mail is sent. */
function apart<K extends MailKind>(kind: K, facts: MailProps<K>) {
  const names: readonly string[] = SECRET_LINKS[kind] ?? []
  const entries = Object.entries(facts)
  const secrets = entries.filter(([name]) => names.includes(name))
  return {
    props: Object.fromEntries(entries.filter(([name]) => !names.includes(name))),
    secrets: secrets.length > 0 ? Object.fromEntries(secrets) : null,
  }
}
