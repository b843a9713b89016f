import { randomUUID } from 'node:crypto'
import { QueryTypes } from 'sequelize'
import { describe, expect, test } from 'vitest'
import { refuse } from '@/lib/core/result'
import { sequelize } from '@/lib/db/sequelize'
import { bounceMail } from '@/lib/services/mails/bounce-mail'
import { claimMail } from '@/lib/services/mails/claim-mail'
import { AuditEntry, type Person, SignInToken } from '@/models'
import { at, NOW } from '@/tests/support/worlds/base'
import { makePerson } from '@/tests/support/worlds/person'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { queued, sent, useMailServer } from './mail-world'

const arrived = useMailServer()
const SECRET = 'q8Hn2mYw4tZr6vKs0pLd1xCf3gJb5aUe7iOoT9zN_Xk'

const token = (person: Person, expiresAt = at('2099-01-01T00:00:00Z')) =>
  SignInToken.create({
    emailNormal: person.emailNormal ?? '',
    tokenHash: randomUUID(),
    createdAt: NOW,
    expiresAt,
  })
const refundMail = async (emailNormal: string) => {
  const { workshop } = await makeWorkshop()
  const person = await makePerson({ emailNormal })
  return {
    person,
    workshop,
    mail: await queued('refund_sent', { person, workshopId: workshop.id, subjectId: randomUUID() }),
  }
}
const events = async (subjectId: string) =>
  (await AuditEntry.findAll({ where: { subjectId }, order: ['seq'] })).map((entry) => entry.event)

test('a mail goes out in the name of the workshop and its answers go to the maker', async () => {
  const { workshop, owner } = await makeWorkshop({ name: 'Hollow Pier Modular' })
  const person = await makePerson({ emailNormal: 'kei@example.org', emailShown: 'Kei@example.org' })
  const mail = await sent(
    await queued('refund_sent', { person, workshopId: workshop.id, subjectId: randomUUID() }),
  )

  expect(arrived).toHaveLength(1)
  expect(arrived[0]).toMatchObject({ to: 'kei@example.org', messageId: mail.messageId })
  expect(arrived[0]?.subject).toBe('€201.90 is on its way back: order HP-1042')
  expect(arrived[0]?.headers.from).toBe('Hollow Pier Modular <post@brimline.example>')
  expect(arrived[0]?.headers['reply-to']).toBe(`${owner.name} <${workshop.replyTo}>`)
  expect(arrived[0]?.text).toContain('Mara Quill, Am Kai 3, 20457 Hamburg, GERMANY')
  expect(arrived[0]?.headers).not.toHaveProperty('list-unsubscribe')
  expect(mail).toMatchObject({
    state: 'sent',
    attempts: 1,
    subjectLine: arrived[0]?.subject,
    lastError: null,
  })
  expect(await events(mail.id)).toEqual(['queue', 'claim', 'accept'])
})

test('a second job for a sent mail sends nothing', async () => {
  const { mail } = await refundMail('twice@example.org')
  await sent(await sent(mail))
  expect(arrived).toHaveLength(1)
})

test('the link of a sign-in mail is forgotten once it was sent', async () => {
  const person = await makePerson({ emailNormal: 'link@example.org' })
  const mail = await sent(await queued('sign_in_link', { person, subjectId: (await token(person)).id }))
  expect(arrived[0]?.text).toContain(SECRET)
  expect(mail.secrets).toBeNull()
  expect(JSON.stringify(mail.toJSON())).not.toContain(SECRET)
  expect(mail.bodyText).toContain('https://brimline.example\n')
})

test('a sign-in link that has expired is dropped', async () => {
  const person = await makePerson({ emailNormal: 'expired@example.org' })
  const old = await token(person, at('2020-01-01T00:00:00Z'))
  const mail = await sent(await queued('sign_in_link', { person, subjectId: old.id }))
  expect(mail).toMatchObject({ state: 'dropped', lastError: 'no_longer_true', secrets: null })
  expect(arrived).toEqual([])
})

test('a person who was erased gets nothing', async () => {
  const { person, mail } = await refundMail('erased@example.org')
  await person.update({ emailNormal: null, emailShown: null, name: null, erasedAt: NOW })
  expect(await sent(mail)).toMatchObject({ state: 'dropped', lastError: 'no_address' })
  expect(arrived).toEqual([])
})

test('a server that says "later" gets the same mail again, after a pause', async () => {
  const { mail } = await refundMail('later@example.org')
  const before = Date.now()
  expect(await sent(mail)).toMatchObject({ state: 'queued', attempts: 1, lastError: 'not_now' })
  const [job] = await sequelize.query<{ run_at: Date }>(
    `select run_at from graphile_worker._private_jobs where payload ->> 'mailId' = :id order by id desc limit 1`,
    { replacements: { id: mail.id }, type: QueryTypes.SELECT },
  )
  expect(job?.run_at.getTime()).toBeGreaterThanOrEqual(before + 10_000)

  expect(await sent(mail)).toMatchObject({ state: 'sent', attempts: 2, lastError: null })
  expect(arrived.map((one) => one.messageId)).toEqual([mail.messageId])
  expect(await events(mail.id)).toEqual(['queue', 'claim', 'defer', 'claim', 'accept'])
})

test('the last of 24 tries gives up', async () => {
  const { mail } = await refundMail('later+never@example.org')
  await mail.update({ attempts: 23 })
  expect(await sent(mail)).toMatchObject({ state: 'given_up', attempts: 24, lastError: 'not_now' })
})

test('an address that does not exist marks its person until a mail arrives again', async () => {
  const { person, workshop, mail } = await refundMail('bounce@example.org')
  expect(await sent(mail)).toMatchObject({ state: 'given_up', lastError: 'address_refused' })
  expect((await person.reload()).mailBouncedAt).toBeInstanceOf(Date)

  await person.update({ emailNormal: 'mended@example.org', emailShown: 'mended@example.org' })
  await sent(await queued('refund_sent', { person, workshopId: workshop.id, subjectId: randomUUID() }))
  expect((await person.reload()).mailBouncedAt).toBeNull()
})

test('a mail that comes back later is found by its Message-ID, once', async () => {
  const { person, mail } = await refundMail('gone@example.org')
  await sent(mail)
  const report = { messageId: mail.messageId, report: '550 5.1.1 mailbox removed', now: NOW }
  expect((await bounceMail(report)).ok).toBe(true)
  expect(await mail.reload()).toMatchObject({
    state: 'bounced',
    endedAt: NOW,
    lastError: '550 5.1.1 mailbox removed',
  })
  expect((await person.reload()).mailBouncedAt).toEqual(NOW)
  expect(await bounceMail(report)).toEqual(refuse('not_allowed'))
  expect(await bounceMail({ ...report, messageId: '<other@localhost>' })).toEqual(refuse('not_found'))
})

describe('line breaks', () => {
  test.each([
    ['the workshop', { name: 'Pier\r\nBcc: all@example.org' }],
    ['the answer address', { replyTo: 'mara@example.org\r\nBcc: all@example.org' }],
  ])('in the name of %s keep the mail from leaving', async (_where, over) => {
    const { workshop } = await makeWorkshop(over)
    const person = await makePerson()
    const mail = await queued('refund_sent', { person, workshopId: workshop.id, subjectId: randomUUID() })
    expect(await sent(mail)).toMatchObject({ state: 'given_up', lastError: 'unsafe_header' })
    expect(arrived).toEqual([])
  })

  test('in the address as it was typed keep the mail from leaving', async () => {
    const { person, mail } = await refundMail('typed@example.org')
    await person.update({ emailShown: 'typed@example.org\r\nRCPT TO:<all@example.org>' })
    expect(await sent(mail)).toMatchObject({ state: 'given_up', lastError: 'unsafe_header' })
    expect(arrived).toEqual([])
  })
})

test('a mail left half sent by a killed worker is taken again under the same Message-ID', async () => {
  const { mail } = await refundMail('half@example.org')
  expect((await claimMail({ mailId: mail.id, now: NOW })).ok).toBe(true)
  expect(await sent(mail)).toMatchObject({ state: 'sent', attempts: 2 })
  expect(arrived.map((one) => one.messageId)).toEqual([mail.messageId])
  expect(await events(mail.id)).toEqual(['queue', 'claim', 'defer', 'claim', 'accept'])
})

test('a mail that is not there is refused', async () => {
  expect(await claimMail({ mailId: randomUUID(), now: NOW })).toEqual(refuse('not_found'))
})
