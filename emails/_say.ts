import { minor, type Day } from '@/lib/core/brand'
import { formatMoney } from '@/lib/core/money/format'
import { offerNames } from '@/lib/messages/mails/words'
import { LOCALE } from '@/lib/messages/ui'
import { writtenDay, writtenInstant } from '@/lib/messages/written'

/** Turns facts into the text of one mail: English, instants in the sender's zone. */
export const sayFor = (timeZone: string) => ({
  money: (amount: number, currency: string) => formatMoney(minor(amount), currency, LOCALE),
  day: (day: Day) => writtenDay(day),
  instant: (at: string) => writtenInstant(at, { zone: timeZone }),
  offer: (offer: keyof typeof offerNames) => offerNames[offer],
  units: (quantity: number, module: string, offer: keyof typeof offerNames) =>
    `${quantity} × ${module}, ${offerNames[offer]}`,
})

export type Say = ReturnType<typeof sayFor>
