import { QueryTypes } from 'sequelize'
import { describe, expect, test } from 'vitest'
import { parseWhole } from '@/lib/db/parse-whole'
import { sequelize } from '@/lib/db/sequelize'

async function read(expression: string) {
  const [row] = await sequelize.query<{ value: unknown }>(`select ${expression} as value`, {
    type: QueryTypes.SELECT,
  })
  return row?.value
}

describe('what comes back from the database', () => {
  test('64-bit whole numbers are numbers, up to what a number holds exactly', async () => {
    expect(await read('9007199254740991::bigint')).toBe(9007199254740991)
    expect(await read('(-9007199254740991)::bigint')).toBe(-9007199254740991)
    expect(await read('(select sum(x)::bigint from (values (1), (2)) as v(x))')).toBe(3)
    await expect(read('9007199254740992::bigint')).rejects.toThrow('not a safe integer')
  })

  test('decimals stay text, days stay days, instants are UTC', async () => {
    expect(await read("'0.400000'::numeric(18,6)")).toBe('0.400000')
    expect(await read("'2027-03-28'::date")).toBe('2027-03-28')
    expect(await read("'2027-03-28T02:30:00+02:00'::timestamptz")).toEqual(new Date('2027-03-28T00:30:00Z'))
    expect(await read("current_setting('timezone')")).toMatch(/^(UTC|\+00:00|<\+00>-00)$/)
  })
})

test.each(['9007199254740992', '-9007199254740992', '9223372036854775807', 'x'])('%s is refused', (text) => {
  expect(() => parseWhole(text)).toThrow(RangeError)
})
