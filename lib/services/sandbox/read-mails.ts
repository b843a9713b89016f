import 'server-only'
import { env } from '@/lib/config/env'
import { ok, refuse } from '@/lib/core/result'
import { readSandboxMails } from '@/lib/gateways/mailer/sandbox-mailbox'

/**
 * The sandbox's mailbox, newest first; `to` names one receiver.
 * Refuses: not_found outside the sandbox. Writes: nothing. Repeat: safe.
 */
export async function readMails({ to }: { to?: string | undefined }) {
  if (!env().SANDBOX) return refuse('not_found')
  return ok({ items: await readSandboxMails(to === undefined ? {} : { to }) })
}
