import { afterAll, beforeAll, beforeEach, expect, test } from 'vitest'
import { type Mailer, type Message } from '@/lib/gateways/mailer/types'
import { smtpMailer } from '@/lib/gateways/mailer/smtp'
import { type KeptMail } from '@/scripts/sandbox-mail/kept-mail'
import { startMailServer, type MailServer } from '@/scripts/sandbox-mail/start-mail-server'

const kept: KeptMail[] = []
let server: MailServer
let mailer: Mailer

beforeAll(async () => {
  server = await startMailServer({ port: 0, keep: async (mail) => void kept.push(mail) })
  mailer = smtpMailer(`smtp://127.0.0.1:${server.port}`)
})
beforeEach(() => void kept.splice(0))
afterAll(async () => {
  mailer.close()
  await server.close()
})

const message = (change: Partial<Message> = {}): Message => ({
  messageId: '<deposit_received.7c0e.1@brimline.example>',
  from: { name: 'Hollow Pier Modular', address: 'post@brimline.example' },
  replyTo: { name: 'Ines Tidewell', address: 'ines@hollow-pier.example' },
  to: 'kei@example.org',
  subject: 'Anzahlung für „Rowlock“ 深い',
  html: '<p>Grüße, 深い</p>',
  text: 'Grüße, 深い\n',
  unsubscribeUrl: null,
  date: new Date('2027-03-01T09:00:00Z'),
  ...change,
})

test('a mail arrives as it was written, from the workshop, with its own Message-ID and an answer address', async () => {
  expect((await mailer.send(message())).ok).toBe(true)
  const [mail, ...more] = kept
  expect(more).toEqual([])
  expect(mail).toMatchObject({
    messageId: '<deposit_received.7c0e.1@brimline.example>',
    to: 'kei@example.org',
    subject: 'Anzahlung für „Rowlock“ 深い',
    text: 'Grüße, 深い\n',
    at: new Date('2027-03-01T09:00:00Z'),
  })
  expect(mail?.html).toContain('Grüße, 深い')
  expect(mail?.headers.from).toBe('Hollow Pier Modular <post@brimline.example>')
  expect(mail?.headers['reply-to']).toBe('Ines Tidewell <ines@hollow-pier.example>')
  expect(mail?.headers['auto-submitted']).toBe('auto-generated')
  expect(mail?.headers).not.toHaveProperty('list-unsubscribe')
})

test('news carries the two headers of one-click unsubscribing (RFC 8058, section 3.1)', async () => {
  const unsubscribeUrl =
    'https://brimline.example/api/unsubscribe/q8Hn2mYw4tZr6vKs0pLd1xCf3gJb5aUe7iOoT9zN_Xk'
  await mailer.send(message({ unsubscribeUrl }))
  expect(kept[0]?.headers['list-unsubscribe']).toBe(`<${unsubscribeUrl}>`)
  expect(kept[0]?.headers['list-unsubscribe-post']).toBe('List-Unsubscribe=One-Click')
})

test.each<[string, Partial<Message>]>([
  ['a subject', { subject: 'Rowlock\r\nBcc: all@example.org' }],
  ['a workshop name', { from: { name: 'Pier\nBcc: all@example.org', address: 'post@brimline.example' } }],
  ['a maker name', { replyTo: { name: 'Ines\r\n\r\nbody', address: 'ines@hollow-pier.example' } }],
  ['an address', { to: 'kei@example.org\r\nRCPT TO:<all@example.org>' }],
  ['an unsubscribe address', { unsubscribeUrl: 'https://brimline.example/\r\nX: y' }],
  ['a Message-ID', { messageId: '<a@b>\r\nX: y' }],
])('a line break in %s is refused and nothing leaves', async (_where, change) => {
  expect(await mailer.send(message(change))).toEqual({ ok: false, reason: 'unsafe_header' })
  expect(kept).toEqual([])
})

test.each([
  'kei@example.org, all@example.org',
  'Kei <kei@example.org>',
  '<kei@example.org>',
  'kei',
  '"a b"@example.org',
  '',
])('a receiver that is not one plain address is refused: %s', async (to) => {
  expect(await mailer.send(message({ to }))).toEqual({ ok: false, reason: 'unsafe_header' })
  expect(kept).toEqual([])
})

test('an address that does not exist is refused for good', async () => {
  expect(await mailer.send(message({ to: 'bounce@example.org' }))).toEqual({
    ok: false,
    reason: 'address_refused',
  })
  expect(await mailer.send(message({ to: 'bounce+two@example.org' }))).toEqual({
    ok: false,
    reason: 'address_refused',
  })
  expect((await mailer.send(message({ to: 'bouncer@example.org' }))).ok).toBe(true)
})

test('a server that says "later" takes the same mail on the next try', async () => {
  const late = message({ to: 'later@example.org' })
  expect(await mailer.send(late)).toEqual({ ok: false, reason: 'not_now' })
  expect((await mailer.send(late)).ok).toBe(true)
  expect(kept.map((mail) => mail.messageId)).toEqual([late.messageId])
})

test('a mail too large for the server is refused for good, one the server cannot keep is not', async () => {
  const huge = 'a'.repeat(1_100_000)
  expect(await mailer.send(message({ text: huge }))).toEqual({ ok: false, reason: 'message_refused' })

  const full = await startMailServer({ port: 0, keep: () => Promise.reject(new Error('disk full')) })
  const toFull = smtpMailer(`smtp://127.0.0.1:${full.port}`)
  expect(await toFull.send(message())).toEqual({ ok: false, reason: 'not_now' })
  toFull.close()
  await full.close()
})

test('a server out of reach means "not now"', async () => {
  const gone = await startMailServer({ port: 0, keep: async () => {} })
  await gone.close()
  const toGone = smtpMailer(`smtp://127.0.0.1:${gone.port}`)
  expect(await toGone.send(message())).toEqual({ ok: false, reason: 'not_now' })
  toGone.close()
})
