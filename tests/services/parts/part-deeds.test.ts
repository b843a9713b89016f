import { beforeAll, expect, test } from 'vitest'
import { AlternateInput, QuoteInput, StockInput } from '@/lib/contracts/part-forms'
import { ok, refuse } from '@/lib/core/result'
import { getPartDesk } from '@/lib/queries/modules-admin/get-part-desk'
import { addAlternate } from '@/lib/services/parts/add-alternate'
import { countStock } from '@/lib/services/parts/count-stock'
import { removeAlternate } from '@/lib/services/parts/remove-alternate'
import { writeQuote } from '@/lib/services/parts/write-quote'
import { Part, StockMove } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePartsList } from '@/tests/support/worlds/decision'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let part: Part
let at: { actor: Awaited<ReturnType<typeof actorOf>>; workshopId: string; now: Date }
beforeAll(async () => {
  world = await pier()
  part = (await makePartsList(world)).part
  at = { actor: await actorOf(world.owner), workshopId: world.workshop.id, now: NOW }
})
const desk = async () => {
  const found = await getPartDesk({ ...at, module: 'rowlock', part: part.id, today: '2027-03-01' })
  if (!found) throw new Error('no part')
  return found
}
const QUOTE = {
  ...{ supplier: 'Brasswick', currency: 'eur', moq: '10', multiple: '', setup: '' },
  ...{ breaks: '1: 0.12; 100: 0.09', leadDays: '5', quotedOn: '2027-02-20', stockSeen: '900' },
}
const quote = (over: object = {}) => QuoteInput.safeParse({ part: part.id, ...QUOTE, ...over })

test('a quote is written down, and corrected when written again for the same day', async () => {
  expect(await writeQuote({ ...at, input: quote().data! })).toEqual(ok({ part: part.id }))
  await writeQuote({ ...at, input: quote({ breaks: '1: 0.11' }).data! })
  const { quotes } = await desk()
  expect(quotes.filter(({ supplier }) => supplier === 'Brasswick')).toMatchObject([
    // 0.11 euro are 11 cents; nine days from 20 February to 1 March.
    {
      breaks: [{ from: 1, unitPrice: expect.stringMatching(/^11(\.0+)?$/) }],
      ageDays: 9,
      moq: 10,
      multiple: 1,
    },
  ])
  const late = await writeQuote({ ...at, input: quote({ quotedOn: '2027-03-02' }).data! })
  expect(late).toMatchObject({ errors: { quotedOn: expect.any(String) } })
})

test.each<[string, object, string]>([
  ['multiples of nothing', { multiple: '0' }, 'multiple'],
  ['a negative stock', { stockSeen: '-3' }, 'stockSeen'],
  ['prices out of order', { breaks: '100: 0.1; 1: 0.2' }, 'breaks'],
  ['a currency that is none', { currency: 'QQQ' }, 'currency'],
  ['no supplier', { supplier: '' }, 'supplier'],
])('%s are refused at the field', (_, over, field) => {
  expect(quote(over).error?.issues.map(({ path }) => path.join('.'))).toContain(field)
})

test('what is counted becomes a move of the difference; the same count none', async () => {
  const count = (onHand: number) =>
    countStock({ ...at, input: StockInput.parse({ part: part.id, onHand: String(onHand) }) })
  expect(await count(40)).toEqual(ok({ part: part.id, onHand: 40 }))
  await count(40)
  await count(25)
  const moves = await StockMove.findAll({ where: { partId: part.id }, order: [['at', 'ASC']] })
  expect(moves.map(({ change }) => change).sort((a, b) => a - b)).toEqual([-15, 40])
  expect((await desk()).onHand).toBe(25)
  const negative = StockInput.safeParse({ part: part.id, onHand: '-1' })
  expect(negative.error?.issues[0]?.path).toEqual(['onHand'])
})

test('another part may stand in, but not itself and none nobody has', async () => {
  const other = await Part.create({ workshopId: at.workshopId, code: 'R-OTHER', createdAt: NOW })
  const add = (code: string) =>
    addAlternate({ ...at, input: AlternateInput.parse({ part: part.id, code, note: 'Taller.' }) })
  expect(await add('R-OTHER')).toEqual(ok({ part: part.id }))
  expect((await desk()).alternates).toMatchObject([{ code: 'R-OTHER', note: 'Taller.' }])
  expect(await add(part.code)).toMatchObject({ errors: { code: expect.stringMatching(/itself/) } })
  expect(await add('NONE')).toMatchObject({ errors: { code: expect.any(String) } })
  const input = { part: part.id, alternate: other.id }
  expect(await removeAlternate({ ...at, input })).toEqual(ok({ part: part.id }))
  expect(await removeAlternate({ ...at, input })).toEqual(refuse('not_found'))
})

test('only the owner writes, and only of the own workshop', async () => {
  const actor = await actorOf(world.packer)
  expect(await writeQuote({ ...at, actor, input: quote().data! })).toEqual(refuse('forbidden'))
  const stranger = await actorOf(world.fenLamp.owner)
  const theirs = { ...at, actor: stranger, workshopId: world.fenLamp.workshop.id }
  expect(await writeQuote({ ...theirs, input: quote().data! })).toEqual(refuse('not_found'))
  expect(await getPartDesk({ ...theirs, module: 'rowlock', part: part.id, today: '2027-03-01' })).toBeNull()
})
