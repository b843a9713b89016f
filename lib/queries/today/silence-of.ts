import 'server-only'
import type { Silence } from '@/lib/contracts/today'
import type { Day } from '@/lib/core/brand'
import { delayRule } from '@/lib/core/promises/delay'
import type { CountryOrders } from './read-promises'

/** What silence would do, country by country, were a notice without a new date sent today. */
export function silenceOf(
  byCountry: readonly CountryOrders[],
  { postedBy, today, holidays }: { postedBy: Day; today: Day; holidays: readonly Day[] },
): Silence[] {
  return byCountry.map(({ country, orders, worthMinor, currency, notices }) => {
    const notice = { country, promisedBy: postedBy, revisedBy: null, sentOn: today }
    const { silenceMeans, answerBy } = delayRule({ ...notice, noticeNumber: notices + 1, holidays })
    return { country, orders, worthMinor, currency, silenceMeans, answerBy }
  })
}
