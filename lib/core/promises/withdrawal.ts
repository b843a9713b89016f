import type { Day } from '@/lib/core/brand'
import { isCountry } from '@/lib/core/data/country'
import { isEuMember } from '@/lib/core/data/eu-members'
import { toWorkingDay } from '@/lib/core/promises/working-days'
import { addDays } from '@/lib/core/time/day'

/** States outside the Union that apply Directive 2011/83 (EEA, from memory), and the United Kingdom with its own Act. */
const LIKE_THE_UNION: readonly string[] = ['GB', 'IS', 'LI', 'NO']

/** Parts of member states with a country code of their own where the law of the Union applies (TFEU Art. 355, from memory). */
const PARTS_OF_THE_UNION: readonly string[] = ['AX', 'GF', 'GP', 'MF', 'MQ', 'RE', 'YT']

/**
 * Whether consumers of a country may withdraw from a distance sale by law, without a reason.
 * Data with a date (2026), not legal advice; elsewhere the workshop's terms say what is given.
 * Domain:  an ISO 3166-1 alpha-2 code → otherwise RangeError.
 * Source:  Directive 2011/83/EU Art. 9 (EU and EEA); Consumer Contracts Regulations 2013 reg. 29 (GB).
 * @example hasWithdrawalRight('DE')  // → true
 * @example hasWithdrawalRight('US')  // → false
 */
export function hasWithdrawalRight(country: string): boolean {
  if (!isCountry(country)) {
    throw new RangeError(`hasWithdrawalRight: country must be an ISO 3166-1 alpha-2 code, got ${country}`)
  }
  return [LIKE_THE_UNION, PARTS_OF_THE_UNION].some((list) => list.includes(country)) || isEuMember(country)
}

/**
 * The last day on which a buyer may withdraw; it ends at that day's midnight.
 * 14 days after the last piece arrived, the day of delivery not counted, moved off weekends and holidays
 * (the British regulations do not move it; the later day is given there too, since it can only favour the buyer).
 * Domain:  a country for which `hasWithdrawalRight` holds, valid days → otherwise RangeError.
 * Source:  Directive 2011/83/EU Art. 9(2)(b); Regulation 1182/71 Art. 3(1), 3(4); CCR 2013 reg. 30. Dated 2026.
 * @example withdrawalEnds({ country: 'DE', lastDeliveredOn: '2026-03-02', holidays: [] })  // → '2026-03-16'
 */
export function withdrawalEnds(sale: {
  readonly country: string
  readonly lastDeliveredOn: Day
  readonly holidays: readonly Day[]
}): Day {
  if (!hasWithdrawalRight(sale.country)) {
    throw new RangeError(`withdrawalEnds: country must be one with a right to withdraw, got ${sale.country}`)
  }
  return toWorkingDay(addDays(sale.lastDeliveredOn, 14), sale.holidays)
}
