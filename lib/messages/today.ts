import { countryName } from '@/lib/core/data/country'
import { formatMoney } from '@/lib/core/money/format'
import { plural } from './plural'
import { writtenDay, writtenNumber } from './written'

const orders = (count: number) => plural(count, { one: '# order', other: '# orders' })

type Silence = {
  country: string
  orders: number
  worthMinor: number
  currency: string
  silenceMeans: 'wait' | 'cancel'
  answerBy: string
}
type Item = { count: number } & (
  | { what: 'decide_soon'; decideBy: string; callsOffOn: string; deposited: number; minimum: number }
  | { what: 'ready_to_lock'; deposited: number; minimum: number }
  | { what: 'notices_due'; postedBy: string; silence: readonly Silence[] }
  | {
      what:
        | 'balances_failed'
        | 'problems_open'
        | 'disputes'
        | 'refunds_waiting'
        | 'quotes_old'
        | 'parts_late'
        | 'mails_bounced'
        | 'parcels_ready'
    }
)
type Words = { title: string; detail: string; action: string }

/** What needs the owner today: a title, what follows if nothing is done, one action. */
export const todayWords = {
  title: 'What needs you today',
  none: 'Nothing needs you today.',
  count: (count: number) => plural(count, { one: '# thing', other: '# things' }),
  runOf: ({ module, number }: { module: string; number: number }) => `${module}, run ${number}`,
  item(item: Item, locale: string): Words {
    const { count } = item
    switch (item.what) {
      case 'decide_soon':
        return {
          title: `Decide by ${writtenDay(item.decideBy)}`,
          detail: `${writtenNumber(item.deposited)} of ${writtenNumber(item.minimum)} under deposit. Undecided, it calls itself off on ${writtenDay(item.callsOffOn)} and everyone is paid back.`,
          action: 'Look at the decision',
        }
      case 'ready_to_lock':
        return {
          title: 'The minimum is reached',
          detail: `${writtenNumber(item.deposited)} of ${writtenNumber(item.minimum)} under deposit. Read the readiness list, then lock.`,
          action: 'Lock the run',
        }
      case 'notices_due':
        return {
          title: `Promised by ${writtenDay(item.postedBy)}, ${orders(count)} not posted`,
          detail: `If it cannot be kept, buyers must be told before it passes. ${silenceWords(item.silence, locale)}`,
          action: 'See the orders',
        }
      case 'balances_failed':
        return {
          title: plural(count, {
            one: '# balance waits for its buyer',
            other: '# balances wait for their buyers',
          }),
          detail: 'The card was refused or the bank wants the buyer. Reminders go out by themselves.',
          action: 'See who',
        }
      case 'problems_open':
        return {
          title: plural(count, { one: '# problem to answer', other: '# problems to answer' }),
          detail: 'A buyer has reported something wrong after posting.',
          action: 'Answer it',
        }
      case 'disputes':
        return {
          title: plural(count, { one: '# payment is disputed', other: '# payments are disputed' }),
          detail: 'The buyer’s bank decides. Until then nothing of the order is packed or paid back.',
          action: 'See the orders',
        }
      case 'refunds_waiting':
        return {
          title: plural(count, { one: '# refund waits', other: '# refunds wait' }),
          detail: 'The balance at the payment provider is too small, or the refund came back.',
          action: 'See the orders',
        }
      case 'quotes_old':
        return {
          title: plural(count, {
            one: '# part without a fresh quote',
            other: '# parts without a fresh quote',
          }),
          detail: 'Quotes of 30 days and more no longer count on the readiness list.',
          action: 'Renew the quotes',
        }
      case 'parts_late':
        return {
          title: plural(count, { one: '# delivery is late', other: '# deliveries are late' }),
          detail: 'Ordered, and the day it was expected has passed.',
          action: 'Look at the run',
        }
      case 'mails_bounced':
        return {
          title: plural(count, { one: '# mail did not arrive', other: '# mails did not arrive' }),
          detail: 'In the last 30 days. Orders of people whose mails come back never lapse by themselves.',
          action: 'See the runs',
        }
      case 'parcels_ready':
        return {
          title: plural(count, { one: '# parcel to pack', other: '# parcels to pack' }),
          detail: 'Paid, and waiting in the pack queue.',
          action: 'Open the pack queue',
        }
    }
  },
}

/** "27 US orders worth X are cancelled automatically on 4 May unless answered" (product.md, Promises). */
function silenceWords(silence: readonly Silence[], locale: string): string {
  const cancelled = silence.filter(({ silenceMeans }) => silenceMeans === 'cancel')
  const waiting = silence.reduce((sum, each) => sum + (each.silenceMeans === 'wait' ? each.orders : 0), 0)
  const said = cancelled.map(
    (each) =>
      `${orders(each.orders)} to ${countryName(each.country)} worth ${formatMoney(each.worthMinor, each.currency, locale)} would be cancelled automatically on ${writtenDay(each.answerBy)} unless answered.`,
  )
  if (waiting > 0)
    said.push(`${orders(waiting)} elsewhere: whoever does not answer waits, and can cancel free of charge.`)
  return said.join(' ')
}
