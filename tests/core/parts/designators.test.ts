import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { classOf, expandDesignators } from '@/lib/core/parts/designators'
import { ok, refuse } from '@/lib/core/result'

describe('expandDesignators', () => {
  test.each<[string, string[]]>([
    ['R1-R4, R7, C10–12', ['R1', 'R2', 'R3', 'R4', 'R7', 'C10', 'C11', 'C12']],
    ['r1 r2;r3', ['R1', 'R2', 'R3']],
    ['R9 - R11', ['R9', 'R10', 'R11']],
    ['C1..C3', ['C1', 'C2', 'C3']],
    ['U1A, U1B', ['U1A', 'U1B']],
    ['R1, R1', ['R1', 'R1']],
    ['R5-R5', ['R5']],
    ['', []],
    [' , ', []],
  ])('%j', (text, names) => expect(expandDesignators(text)).toEqual(ok(names)))

  test.each(['R4-R1', 'R1-C4', 'R', '12', 'R1-', '-R4', 'R1-R4-R7', 'R1-R5000', 'R1/R2', 'R1A-R4'])(
    '%j is unreadable',
    (text) => expect(expandDesignators(text)).toEqual(refuse('unreadable')),
  )

  test('a range names every number between its ends once', () => {
    fc.assert(
      fc.property(fc.constantFrom('R', 'C', 'SW'), fc.nat(900), fc.nat(99), (letters, first, more) => {
        const found = expandDesignators(`${letters}${first}-${first + more}`)
        return (
          found.ok &&
          found.value.join() === Array.from({ length: more + 1 }, (_, i) => `${letters}${first + i}`).join()
        )
      }),
    )
  })
})

test.each([
  ['R1', 'resistor'],
  ['RV2', 'potentiometer'],
  ['RN1', 'resistor_network'],
  ['C3', 'capacitor'],
  ['LED4', 'diode'],
  ['L1', 'inductor'],
  ['U7', 'integrated_circuit'],
  ['IC7', 'integrated_circuit'],
  ['j9', 'connector'],
  ['SW1', 'switch'],
  ['ZZ1', 'other'],
  ['', 'other'],
])('%s is a %s', (designator, name) => expect(classOf(designator)).toBe(name))
