import { minor, type Day } from '@/lib/core/brand'
import { formatMoney } from '@/lib/core/money/format'
import { type MailSender } from '@/lib/contracts/mails'
import { offerNames } from '@/lib/messages/mails/words'

/** Turns facts into the text of one mail: the sender's zone, and English whatever the workshop's own locale is. */
export function sayFor(sender: Pick<MailSender, 'locale' | 'timeZone'>) {
  const locale = /^en\b/.test(sender.locale) ? sender.locale : 'en-GB'
  const inFull = { day: 'numeric', month: 'long', year: 'numeric' } as const
  const days = new Intl.DateTimeFormat(locale, { ...inFull, timeZone: 'UTC' })
  const moments = new Intl.DateTimeFormat(locale, {
    ...inFull,
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZone: sender.timeZone,
    timeZoneName: 'short',
  })
  return {
    money: (amount: number, currency: string) => formatMoney(minor(amount), currency, locale),
    day: (day: Day) => days.format(new Date(`${day}T00:00:00Z`)),
    instant: (at: string) => moments.format(new Date(at)),
    offer: (offer: keyof typeof offerNames) => offerNames[offer],
    units: (quantity: number, module: string, offer: keyof typeof offerNames) =>
      `${quantity} × ${module}, ${offerNames[offer]}`,
  }
}

export type Say = ReturnType<typeof sayFor>
