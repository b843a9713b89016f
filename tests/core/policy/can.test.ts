import { describe, expect, test } from 'vitest'
import type { Role } from '@/lib/core/policy/audience'
import { can, type Actor } from '@/lib/core/policy/can'
import { DEEDS, isDeed, type Deed } from '@/lib/core/policy/deeds'
import { needsSecondFactor, secondFactorFresh } from '@/lib/core/policy/second-factor'
import { DEED_TABLE } from './deed-table'

const HERE = { workshopId: 'here', personId: 'buyer' }
const person = (personId: string, role?: Role, host = false, workshopId = 'here'): Actor => ({
  kind: 'person',
  personId,
  email: `${personId}@example.org`,
  memberships: role ? [{ workshopId, role }] : [],
  host,
  secondFactorAt: null,
})
const ACTORS: Record<string, Actor> = {
  V: { kind: 'visitor' },
  P: person('somebody'),
  S: person('buyer'),
  B: person('bea', 'bench'),
  K: person('kim', 'packer'),
  O: person('ola', 'owner'),
  H: person('hal', undefined, true),
}
const ROWS = DEED_TABLE.split('\n')
  .map((line) => line.trim().split(/\s+/))
  .flatMap(([deed, row, factor]): [Deed, string, string?][] => (row ? [[deed as Deed, row, factor]] : []))

describe('the role × deed table', () => {
  test('has a row for every deed and no other', () => {
    expect(ROWS.map(([deed]) => deed).toSorted()).toEqual(DEEDS.toSorted())
  })

  test.each(ROWS)('%s', (deed, row, factor) => {
    const allowed = Object.entries(ACTORS).map(([letter, actor]) => (can(actor, deed, HERE) ? letter : '.'))
    expect(allowed.join('')).toBe(row)
    expect(needsSecondFactor(deed)).toBe(factor === '2')
  })

  test('a deed is written noun:verb', () => {
    expect(DEEDS.filter((deed) => !/^[a-z]+(_[a-z]+)*:[a-z]+(_[a-z]+)*$/.test(deed))).toEqual([])
  })
})

describe('another workshop', () => {
  test.each(['owner', 'bench', 'packer'] as const)(
    'its %s may do here what anybody signed in may',
    (role) => {
      const neighbour = person('nan', role, false, 'elsewhere')
      for (const deed of DEEDS) expect(can(neighbour, deed, HERE), deed).toBe(can(ACTORS['P']!, deed, HERE))
    },
  )

  test('roles in two workshops do not add up', () => {
    const both: Actor = {
      ...(person('two') as Extract<Actor, { kind: 'person' }>),
      memberships: [
        { workshopId: 'here', role: 'packer' },
        { workshopId: 'elsewhere', role: 'owner' },
      ],
    }
    expect(can(both, 'run:lock', { workshopId: 'here' })).toBe(false)
    expect(can(both, 'run:lock', { workshopId: 'elsewhere' })).toBe(true)
    expect(can(both, 'parcel:pack', { workshopId: 'here' })).toBe(true)
  })
})

describe('a target that names nobody', () => {
  test('gives no right of a role and none of a buyer', () => {
    for (const deed of DEEDS) {
      expect(can(ACTORS['O']!, deed), deed).toBe(can(ACTORS['P']!, deed))
      expect(can(ACTORS['S']!, deed), deed).toBe(can(ACTORS['P']!, deed))
    }
  })

  test('an unknown deed is a bug of the caller', () => {
    expect(isDeed('run:paint')).toBe(false)
    expect(() => can(ACTORS['O']!, 'run:paint' as Deed, HERE)).toThrow(/run:paint/)
    expect(() => can(ACTORS['O']!, 'toString' as Deed, HERE)).toThrow(RangeError)
  })
})

describe('the second factor', () => {
  const at = (text: string) => new Date(`2026-03-02T${text}Z`)
  const given = (secondFactorAt: Date | null): Actor => ({
    ...(person('ola', 'owner') as Extract<Actor, { kind: 'person' }>),
    secondFactorAt,
  })
  test.each([
    [at('09:00:00'), at('09:00:00'), true],
    [at('09:00:00'), at('09:15:00'), true],
    [at('09:00:00'), at('09:15:00.001'), false],
    [at('09:00:00'), at('08:59:59'), false],
    [null, at('09:00:00'), false],
  ])('given %s, asked %s: %s', (factor, now, fresh) => {
    expect(secondFactorFresh(given(factor), now)).toBe(fresh)
  })
  test('a visitor has none', () => {
    expect(secondFactorFresh({ kind: 'visitor' }, at('09:00:00'))).toBe(false)
  })
})
