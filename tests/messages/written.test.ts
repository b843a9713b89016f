import { expect, test } from 'vitest'
import { plural } from '@/lib/messages/plural'
import {
  writtenDay,
  writtenInstant,
  writtenNumber,
  writtenPercent,
  writtenRoundMoney,
  writtenWeight,
} from '@/lib/messages/written'

test('days are written in full, with the weekday when asked', () => {
  // 3 March 2027 is a Wednesday (1 January 2027 is a Friday; 61 days later).
  expect(writtenDay('2027-03-03')).toBe('3 March 2027')
  expect(writtenDay('2027-03-03', { weekday: true })).toBe('Wednesday 3 March 2027')
  expect(() => writtenDay('soon')).toThrow(/soon/)
})

test('instants carry their zone, on both sides of summer time', () => {
  expect(writtenInstant('2027-03-03T13:05:00Z', { zone: 'Europe/Berlin' })).toBe('3 March 2027, 14:05 CET')
  expect(writtenInstant('2027-07-03T13:05:00Z', { zone: 'Europe/Berlin' })).toBe('3 July 2027, 15:05 CEST')
  expect(writtenInstant('2027-12-31T23:30:00Z', { zone: 'Asia/Tokyo' })).toMatch(/^1 January 2028, 08:30 /)
  expect(() => writtenInstant('later', { zone: 'UTC' })).toThrow(/later/)
})

test('weights turn to kilograms at one kilogram', () => {
  expect(writtenWeight(999)).toBe('999 g')
  expect(writtenWeight(1000)).toBe('1.000 kg')
  expect(writtenWeight(1250)).toBe('1.250 kg')
})

test('a share that is merely close to nothing or everything never reads as it', () => {
  expect(writtenPercent(0)).toBe('0 %')
  expect(writtenPercent(1)).toBe('100 %')
  expect(writtenPercent(0.834)).toBe('83 %')
  expect(writtenPercent(0.0049)).toBe('under 1 %')
  expect(writtenPercent(0.9951)).toBe('over 99 %')
  expect(writtenPercent(0.2345, { digits: 1 })).toBe('23.5 %')
})

test('sums on an axis follow the currency’s own digits', () => {
  expect(writtenRoundMoney(-250000, 'GBP')).toBe('-£2,500')
  expect(writtenRoundMoney(2500, 'JPY', { locale: 'en' })).toBe('¥2,500')
  expect(writtenNumber(1200)).toBe('1,200')
})

test('counts take the form their language asks for', () => {
  const forms = { one: '# order', other: '# orders' }
  expect(plural(0, forms)).toBe('0 orders')
  expect(plural(1, forms)).toBe('1 order')
  expect(plural(1200, forms)).toBe('1,200 orders')
  // Polish: 1 one, 2–4 few, 5 many (CLDR plural rules).
  const polish = { one: '# moduł', few: '# moduły', many: '# modułów', other: '# modułu' }
  expect([1, 3, 5].map((count) => plural(count, polish, 'pl'))).toEqual(['1 moduł', '3 moduły', '5 modułów'])
})
