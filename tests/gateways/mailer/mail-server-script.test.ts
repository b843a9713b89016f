import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { createServer, type AddressInfo } from 'node:net'
import { expect, test } from 'vitest'
import { closeSandboxMailbox, readSandboxMails } from '@/lib/gateways/mailer/sandbox-mailbox'
import { smtpMailer } from '@/lib/gateways/mailer/smtp'

async function freePort(): Promise<number> {
  const probe = createServer().listen(0, '127.0.0.1')
  await once(probe, 'listening')
  const { port } = probe.address() as AddressInfo
  probe.close()
  await once(probe, 'close')
  return port
}

test('the sandbox mail server says ready, keeps mail, and ends when told to', async () => {
  const SMTP_URL = `smtp://127.0.0.1:${await freePort()}`
  const child = spawn(process.execPath, ['scripts/run.mjs', 'scripts/mail-server.ts'], {
    env: { ...process.env, SMTP_URL },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  const [first] = (await once(child.stdout, 'data')) as [Buffer]
  expect(first.toString()).toBe('ready\n')

  const mailer = smtpMailer(SMTP_URL)
  const sent = await mailer.send({
    messageId: '<script@brimline.example>',
    from: { name: 'Brimline', address: 'post@brimline.example' },
    replyTo: null,
    to: 'kei@example.org',
    subject: 'Your sign-in link',
    html: '<p>Sign in</p>',
    text: 'Sign in',
    unsubscribeUrl: null,
    date: new Date('2027-03-01T09:00:00Z'),
  })
  mailer.close()
  expect(sent.ok).toBe(true)
  expect((await readSandboxMails({})).map((mail) => mail.subject)).toEqual(['Your sign-in link'])
  await closeSandboxMailbox()

  child.kill('SIGTERM')
  expect(await once(child, 'exit')).toEqual([0, null])
}, 60_000)
