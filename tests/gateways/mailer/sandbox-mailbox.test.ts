import { afterAll, beforeAll, expect, test } from 'vitest'
import { closeSandboxMailbox, readSandboxMails } from '@/lib/gateways/mailer/sandbox-mailbox'
import { smtpMailer } from '@/lib/gateways/mailer/smtp'
import { openMailStore } from '@/scripts/sandbox-mail/mail-store'
import { startMailServer, type MailServer } from '@/scripts/sandbox-mail/start-mail-server'

const databaseUrl = process.env.DATABASE_URL ?? ''
let store: Awaited<ReturnType<typeof openMailStore>>
let server: MailServer
let emptyBefore: unknown

const send = async (to: string, messageId: string) => {
  const mailer = smtpMailer(`smtp://127.0.0.1:${server.port}`)
  const sent = await mailer.send({
    messageId,
    from: { name: 'Brimline', address: 'post@brimline.example' },
    replyTo: null,
    to,
    subject: 'Your sign-in link',
    html: '<p>Sign in</p>',
    text: 'Sign in\n',
    unsubscribeUrl: null,
    date: new Date('2027-03-01T09:00:00Z'),
  })
  mailer.close()
  return sent
}

beforeAll(async () => {
  emptyBefore = await readSandboxMails({})
  store = await openMailStore(databaseUrl)
  server = await startMailServer({ port: 0, keep: store.keep })
})
afterAll(async () => {
  await closeSandboxMailbox()
  await server.close()
  await store.close()
})

test('before the mail server has ever run the mailbox is empty', () => {
  expect(emptyBefore).toEqual([])
})

test('what was sent can be read, newest first, for everybody or one receiver', async () => {
  await send('Kei@Example.org', '<one@brimline.example>')
  await send('tom@example.org', '<two@brimline.example>')
  const [newest, first] = await readSandboxMails({})
  expect(newest?.to).toBe('tom@example.org')
  expect(first).toEqual({
    id: expect.stringMatching(/^\d+$/),
    to: 'kei@example.org',
    subject: 'Your sign-in link',
    text: 'Sign in\n',
    html: expect.stringContaining('<p>Sign in</p>'),
    headers: expect.objectContaining({
      'message-id': '<one@brimline.example>',
      'auto-submitted': 'auto-generated',
    }),
    at: '2027-03-01T09:00:00.000Z',
  })
  expect((await readSandboxMails({ to: 'KEI@example.org' })).map((mail) => mail.to)).toEqual([
    'kei@example.org',
  ])
})

test('the same mail once more is one mail', async () => {
  await send('again@example.org', '<again@brimline.example>')
  await send('again@example.org', '<again@brimline.example>')
  expect(await readSandboxMails({ to: 'again@example.org' })).toHaveLength(1)
})

test('two mail servers that start at once on an empty database both come up', async () => {
  const stores = await Promise.all([openMailStore(databaseUrl), openMailStore(databaseUrl)])
  await Promise.all(stores.map((each) => each.close()))
})
