import { describe, expect, test } from 'vitest'
import {
  READINESS_KEYS,
  readinessOf,
  type ReadinessFacts,
  type ReadinessKey,
} from '@/lib/core/states/run-readiness'

const part = { quoteAgeDays: 29, stockSeenAgeDays: 7, endOfLife: false, hasAlternate: false }
const post = { hasWeight: true, hasCustomsCode: true, hasOrigin: true, hasDestinations: true }
const page = { terms: true, cautions: true, postalAddress: true }
const everything: ReadinessFacts = {
  goodUnits: 1,
  openLessons: 0,
  parts: [part, { ...part, endOfLife: true, hasAlternate: true }],
  samples: { marked: 3, checked: 3 },
  partsListErrors: 0,
  post: [post],
  promises: [{ postedBy: '2026-09-01', likelyBy: '2026-09-01' }],
  page,
  canRepay: true,
}
const stateOf = (facts: ReadinessFacts, key: ReadinessKey) =>
  readinessOf(facts).find((line) => line.key === key)?.state

describe('readinessOf', () => {
  test('has the nine lines of the HTTP contract in their order', () => {
    const keys = 'first_good_unit lessons quotes samples parts_list post_data promise page repay'.split(' ')
    expect(READINESS_KEYS).toEqual(keys)
    expect(readinessOf({}).map((line) => line.key)).toEqual(keys)
  })

  test('without data every line is unknown, never ready', () => {
    expect(readinessOf({}).every((line) => line.state === 'unknown')).toBe(true)
    const nothing = { parts: [], post: [], promises: [], goodUnits: null, page: null, canRepay: null }
    expect(readinessOf(nothing).every((line) => line.state === 'unknown')).toBe(true)
  })

  test('with everything done every line is ready', () => {
    expect(readinessOf(everything).every((line) => line.state === 'ready')).toBe(true)
  })

  test.each<[ReadinessKey, ReadinessFacts]>([
    ['first_good_unit', { goodUnits: 0 }],
    ['lessons', { openLessons: 1 }],
    ['quotes', { parts: [part, { ...part, quoteAgeDays: 30 }] }],
    ['quotes', { parts: [part, { ...part, quoteAgeDays: null }] }],
    ['quotes', { parts: [part, { ...part, stockSeenAgeDays: 8 }] }],
    ['quotes', { parts: [part, { ...part, stockSeenAgeDays: null }] }],
    ['quotes', { parts: [part, { ...part, endOfLife: true }] }],
    ['samples', { samples: { marked: 3, checked: 2 } }],
    ['parts_list', { partsListErrors: 1 }],
    ['post_data', { post: [post, { ...post, hasWeight: false }] }],
    ['post_data', { post: [post, { ...post, hasCustomsCode: false }] }],
    ['post_data', { post: [post, { ...post, hasOrigin: false }] }],
    ['post_data', { post: [post, { ...post, hasDestinations: false }] }],
    ['promise', { promises: [{ postedBy: '2026-09-01', likelyBy: '2026-09-02' }] }],
    ['page', { page: { ...page, terms: false } }],
    ['page', { page: { ...page, cautions: false } }],
    ['page', { page: { ...page, postalAddress: false } }],
    ['repay', { canRepay: false }],
  ])('%s is missing %#', (key, change) => {
    const lines = readinessOf({ ...everything, ...change })
    expect(lines.filter((line) => line.state !== 'ready')).toEqual([{ key, state: 'missing' }])
  })

  test('a promise without a schedule is unknown', () => {
    const promises = [{ postedBy: '2026-09-01', likelyBy: null }]
    expect(stateOf({ ...everything, promises }, 'promise')).toBe('unknown')
  })

  test('a line that is not ready is waived with a reason, and only with one', () => {
    const waivers = [
      { key: 'quotes' as const, reason: 'Bought already.' },
      { key: 'lessons' as const, reason: ' ' },
      { key: 'page' as const, reason: 'Not needed.' },
    ]
    const facts = { ...everything, parts: [], openLessons: 2, waivers }
    expect(stateOf(facts, 'quotes')).toBe('waived')
    expect(stateOf(facts, 'lessons')).toBe('missing')
    expect(stateOf(facts, 'page')).toBe('ready')
  })
})
