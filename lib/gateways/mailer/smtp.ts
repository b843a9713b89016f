import 'server-only'
import { createTransport } from 'nodemailer'
import { parseConnectionUrl } from 'nodemailer/lib/shared/index.js'
import { ok, refuse, type Result } from '@/lib/core/result'
import { withSafeHeaders } from '@/lib/gateways/mailer/safe-headers'
import { type Mailer, type Message, type SendFailure } from '@/lib/gateways/mailer/types'

const WITHIN_MS = 20_000

type SmtpError = Error & { code?: string; responseCode?: number; command?: string }

const failureOf = ({ code, responseCode = 0, command = '' }: SmtpError): SendFailure => {
  const forGood = responseCode >= 500 && responseCode < 600
  if (!forGood || code === 'EAUTH') return 'not_now'
  return command === 'RCPT TO' ? 'address_refused' : 'message_refused'
}

const headersOf = ({ unsubscribeUrl }: Message): Record<string, string> => ({
  'Auto-Submitted': 'auto-generated',
  ...(unsubscribeUrl && {
    'List-Unsubscribe': `<${unsubscribeUrl}>`,
    'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
  }),
})

/**
 * Sends over SMTP; the sandbox's mail server is reached the same way, so there is no second implementation.
 * Each step of the talk has 20 seconds. Nothing is retried here: the caller's job is. A failed sign-in at the server
 * is a matter of settings and counts as `not_now`, so that no mail is lost over it.
 */
export function smtpMailer(url: string): Mailer {
  const transport = createTransport({
    // Read here: beside a `url` the library ignores every other option.
    ...parseConnectionUrl(url),
    pool: true,
    maxConnections: 4,
    connectionTimeout: WITHIN_MS,
    greetingTimeout: WITHIN_MS,
    socketTimeout: WITHIN_MS,
    dnsTimeout: WITHIN_MS,
    // A mail is made of text alone: nothing in it may make the worker read a file or fetch an address.
    disableFileAccess: true,
    disableUrlAccess: true,
  } as Parameters<typeof createTransport>[0])

  async function send(message: Message): Promise<Result<{ answer: string }, SendFailure>> {
    const safe = withSafeHeaders(message)
    if (!safe.ok) return safe
    try {
      const sent = await transport.sendMail({
        messageId: message.messageId,
        from: message.from,
        ...(message.replyTo && { replyTo: message.replyTo }),
        to: { name: '', address: message.to },
        envelope: { from: message.from.address, to: [message.to] },
        subject: message.subject,
        html: message.html,
        text: message.text,
        date: message.date,
        headers: headersOf(message),
      })
      return ok({ answer: String((sent as { response?: string }).response ?? '') })
    } catch (error) {
      return refuse(failureOf(error as SmtpError))
    }
  }

  return { send, close: () => transport.close() }
}
