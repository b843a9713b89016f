import { randomUUID } from 'node:crypto'
import { QueryTypes } from 'sequelize'
import { expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { AuditEntry, MailOutbox } from '@/models'
import { sampleFacts } from '@/tests/emails/sample-facts'
import { NOW } from '@/tests/support/worlds/base'
import { makePerson } from '@/tests/support/worlds/person'

const jobs = () =>
  sequelize.query<{ payload: { mailId: string } }>(
    `select j.payload from graphile_worker._private_jobs j join graphile_worker._private_tasks t on t.id = j.task_id
     where t.identifier = 'send_mail'`,
    { type: QueryTypes.SELECT },
  )
const queue = (over: Partial<Parameters<typeof queueMail<'sign_in_link'>>[1]> & { personId: string }) =>
  inTransaction(async (tx) =>
    ok(
      await queueMail(tx, {
        kind: 'sign_in_link',
        workshopId: null,
        subjectId: 'a1',
        props: sampleFacts.sign_in_link,
        now: NOW,
        ...over,
      }),
    ),
  )

test('a mail, its job and its trail are written together, and once', async () => {
  const { id: personId } = await makePerson()
  const subjectId = randomUUID()
  const before = (await jobs()).length

  expect(await queue({ personId, subjectId })).toEqual(ok(true))
  expect(await queue({ personId, subjectId })).toEqual(ok(false))
  expect(await queue({ personId, subjectId, version: 2 })).toEqual(ok(true))

  const mails = await MailOutbox.findAll({ where: { subjectId }, order: ['version'] })
  expect(mails.map((mail) => mail.messageId)).toEqual([
    `<sign_in_link.${subjectId}.1@localhost>`,
    `<sign_in_link.${subjectId}.2@localhost>`,
  ])
  expect((await jobs()).slice(before).map((job) => job.payload.mailId)).toEqual(mails.map((mail) => mail.id))
  const trail = await AuditEntry.findAll({ where: { subjectId: mails.map((mail) => mail.id) } })
  expect(trail.map(({ fromState, event, toState }) => [fromState, event, toState])).toEqual([
    [null, 'queue', 'queued'],
    [null, 'queue', 'queued'],
  ])
})

test('links that act for their holder stand apart from the facts', async () => {
  const { id: personId } = await makePerson()
  const subjectId = randomUUID()
  await queue({ personId, subjectId })
  const mail = await MailOutbox.findOne({ where: { subjectId }, rejectOnEmpty: true })
  expect(mail.props).toEqual({ validMinutes: 10 })
  expect(mail.secrets).toEqual({ signInUrl: sampleFacts.sign_in_link.signInUrl })
})

test('a change that is refused promises no mail', async () => {
  const { id: personId } = await makePerson()
  const subjectId = randomUUID()
  const before = (await jobs()).length
  await inTransaction(async (tx) => {
    const props = sampleFacts.sign_in_link
    await queueMail(tx, { kind: 'sign_in_link', workshopId: null, personId, subjectId, props, now: NOW })
    return refuse('forbidden')
  })
  expect(await MailOutbox.count({ where: { subjectId } })).toBe(0)
  expect(await jobs()).toHaveLength(before)
})

test.each([
  ['facts of another kind', { props: { validMinutes: 0 } as never }],
  ['a link that is none', { props: { signInUrl: 'javascript:alert(1)', validMinutes: 10 } }],
  ['a subject with a line break', { subjectId: 'a\r\nBcc: all@example.org' }],
  ['no subject', { subjectId: '' }],
])('%s are a bug and throw', async (_what, over) => {
  const { id: personId } = await makePerson()
  await expect(queue({ personId, ...over })).rejects.toThrow()
})
