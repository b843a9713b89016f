import { afterAll, beforeAll, beforeEach } from 'vitest'
import { forgetEnv } from '@/lib/config/env'
import { type MailKind, type MailProps } from '@/lib/contracts/mails'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { sendMail } from '@/lib/tasks/send-mail'
import { MailOutbox, type Person } from '@/models'
import { type KeptMail } from '@/scripts/sandbox-mail/kept-mail'
import { startMailServer, type MailServer } from '@/scripts/sandbox-mail/start-mail-server'
import { sampleFacts } from '@/tests/emails/sample-facts'
import { NOW } from '@/tests/support/worlds/base'

/** A mail server for a test file; `arrived` is emptied before each test. */
export function useMailServer() {
  const arrived: KeptMail[] = []
  let server: MailServer
  beforeAll(async () => {
    server = await startMailServer({ port: 0, keep: async (mail) => void arrived.push(mail) })
    process.env.SMTP_URL = `smtp://127.0.0.1:${server.port}`
    forgetEnv()
  })
  beforeEach(() => void arrived.splice(0))
  afterAll(() => server.close())
  return arrived
}

type Given<K extends MailKind> = {
  person: Person
  subjectId: string
  workshopId?: string | null
  version?: number
  props?: Partial<MailProps<K>>
}

/** Queues a mail with the sample facts of its kind and gives its row back. */
export async function queued<K extends MailKind>(kind: K, given: Given<K>): Promise<MailOutbox> {
  const { person, subjectId, workshopId = null, version = 1, props } = given
  await inTransaction(async (tx) => {
    const facts = { ...sampleFacts[kind], ...props } as MailProps<K>
    await queueMail(tx, { kind, workshopId, personId: person.id, subjectId, version, props: facts, now: NOW })
    return ok(null)
  })
  return MailOutbox.findOne({ where: { kind, subjectId, version }, rejectOnEmpty: true })
}

/** Runs the job of a mail once and gives the row as it is then. */
export async function sent(mail: MailOutbox): Promise<MailOutbox> {
  await sendMail({ mailId: mail.id }, { jobId: '1', attempt: 1, maxAttempts: 25 })
  return mail.reload()
}
