import 'server-only'
import { env } from '@/lib/config/env'
import { smtpMailer } from '@/lib/gateways/mailer/smtp'
import { type Mailer } from '@/lib/gateways/mailer/types'

let made: { url: string; mailer: Mailer } | undefined

/** The mail server of this deployment, or the sandbox's: one pool of connections per process. */
export function mailer(): Mailer {
  const url = env().SMTP_URL
  if (made?.url !== url) {
    made?.mailer.close()
    made = { url, mailer: smtpMailer(url) }
  }
  return made.mailer
}
