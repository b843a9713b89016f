import 'server-only'
import { type Mailbox } from '@/lib/gateways/mailer/types'

/**
 * Reads the setting MAIL_FROM: `Name <address>` or an address alone.
 * Throws for anything else: the setting is wrong, and no mail could go out.
 */
export function mailboxOf(setting: string): Mailbox {
  const named = /^\s*"?([^"<>]*?)"?\s*<([^\s<>@]+@[^\s<>@]+)>\s*$/.exec(setting)
  if (named) return { name: named[1] ?? '', address: named[2] ?? '' }
  const alone = setting.trim()
  if (/^[^\s<>@]+@[^\s<>@]+$/.test(alone)) return { name: '', address: alone }
  throw new RangeError(`mailboxOf: setting must be "Name <address>" or an address, got ${setting}`)
}
