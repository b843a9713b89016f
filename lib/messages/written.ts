import { exponentOf } from '@/lib/core/money/currency'
import { LOCALE } from './ui'

type Place = { locale?: string }

/**
 * A calendar day in full.
 * @example writtenDay('2027-03-03')  // → '3 March 2027'
 * @example writtenDay('2027-03-03', { weekday: true })  // → 'Wednesday 3 March 2027'
 */
export function writtenDay(
  day: string,
  { weekday = false, locale = LOCALE }: Place & { weekday?: boolean } = {},
): string {
  const date = new Date(`${day}T12:00:00Z`)
  if (Number.isNaN(date.getTime())) throw new RangeError(`writtenDay: day must be YYYY-MM-DD, got ${day}`)
  return new Intl.DateTimeFormat(locale, {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    weekday: weekday ? 'long' : undefined,
    timeZone: 'UTC',
  })
    .format(date)
    .replace(/^(\p{L}+),/u, '$1')
}

/**
 * The month of a day, short, for the axis of a drawing.
 * @example writtenMonth('2027-03-03')  // → 'Mar'
 */
export function writtenMonth(day: string, { locale = LOCALE }: Place = {}): string {
  return new Intl.DateTimeFormat(locale, { month: 'short', timeZone: 'UTC' }).format(
    new Date(`${day}T12:00:00Z`),
  )
}

/**
 * An instant with the zone it is told in.
 * @example writtenInstant('2027-03-03T13:05:00Z', { zone: 'Europe/Berlin' })  // → '3 March 2027, 14:05 CET'
 */
export function writtenInstant(
  at: Date | string,
  { zone, locale = LOCALE }: Place & { zone: string },
): string {
  const date = new Date(at)
  if (Number.isNaN(date.getTime()))
    throw new RangeError(`writtenInstant: at must be an instant, got ${String(at)}`)
  const day = new Intl.DateTimeFormat(locale, {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    timeZone: zone,
  })
  const time = new Intl.DateTimeFormat(locale, {
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    timeZone: zone,
    timeZoneName: 'short',
  })
  return `${day.format(date)}, ${time.format(date)}`
}

/**
 * A number with the grouping of the language; `digits` after the point, none unless asked.
 * @example writtenNumber(1200)  // → '1,200'
 */
export function writtenNumber(
  value: number,
  { digits = 0, locale = LOCALE }: Place & { digits?: number } = {},
): string {
  return new Intl.NumberFormat(locale, {
    minimumFractionDigits: digits,
    maximumFractionDigits: digits,
  }).format(value)
}

/**
 * A weight as the post writes it: grams below a kilogram, kilograms to the gram from there.
 * @example writtenWeight(640)  // → '640 g'
 * @example writtenWeight(1250)  // → '1.250 kg'
 */
export function writtenWeight(grams: number, { locale = LOCALE }: Place = {}): string {
  return grams < 1000
    ? `${writtenNumber(grams, { locale })} g`
    : `${writtenNumber(grams / 1000, { digits: 3, locale })} kg`
}

/**
 * A ratio from 0 to 1 in per cent. Never says 0 % or 100 % of what is merely close to it.
 * @example writtenPercent(0.834)  // → '83 %'
 * @example writtenPercent(0.999)  // → 'over 99 %'
 * @example writtenPercent(0.001)  // → 'under 1 %'
 */
export function writtenPercent(
  ratio: number,
  { digits = 0, locale = LOCALE }: Place & { digits?: number } = {},
): string {
  const step = 10 ** -digits
  const words = (percent: number) => `${writtenNumber(percent, { digits, locale })} %`
  if (ratio > 0 && ratio * 100 < step / 2) return `under ${words(step)}`
  if (ratio < 1 && ratio * 100 > 100 - step / 2) return `over ${words(100 - step)}`
  return words(ratio * 100)
}

/**
 * A sum without its minor unit, for the axis of a drawing; never for what somebody pays.
 * @example writtenRoundMoney(-250000, 'GBP')  // → '-£2,500'
 */
export function writtenRoundMoney(minor: number, currency: string, { locale = LOCALE }: Place = {}): string {
  const format = new Intl.NumberFormat(locale, { style: 'currency', currency, maximumFractionDigits: 0 })
  return format.format(minor / 10 ** exponentOf(currency))
}
