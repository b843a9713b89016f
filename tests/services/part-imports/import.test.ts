import { beforeAll, expect, test } from 'vitest'
import { ImportSettings, ImportStart } from '@/lib/contracts/part-import'
import { ok, refuse } from '@/lib/core/result'
import { getPartImport } from '@/lib/queries/part-imports/get-part-import'
import { confirmImport } from '@/lib/services/part-imports/confirm-import'
import { setImport } from '@/lib/services/part-imports/set-import'
import { startImport } from '@/lib/services/part-imports/start-import'
import { Part, PartAlternate, PartImport, Quote, RevisionLine } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let at: { actor: Awaited<ReturnType<typeof actorOf>>; workshopId: string; module: string }
beforeAll(async () => {
  world = await pier()
  at = { actor: await actorOf(world.owner), workshopId: world.workshop.id, module: 'rowlock' }
})

const start = async (text: string | Buffer, kind = 'lines') => {
  const isFile = Buffer.isBuffer(text)
  const input = ImportStart.parse({ revision: 'A', kind, text: isFile ? '' : text })
  const file = isFile ? { name: 'list.csv', content: text } : null
  const sent = await startImport({ ...at, input, file, now: NOW })
  if (!sent.ok) throw new Error(sent.reason)
  return sent.value.import
}
const look = async (id: string) => {
  const preview = await getPartImport({ ...at, id })
  if (!preview) throw new Error('no preview')
  return preview
}
const confirm = (id: string) =>
  confirmImport({ actor: at.actor, workshopId: at.workshopId, importId: id, now: NOW })
const lineCount = () => RevisionLine.count({ where: { revisionId: world.revision.id } })

const LIST = [
  'code,value,designators,per_unit,kit,built,alternates',
  'R-10K,10k,R1-R4,4,buyer,assembler,',
  'C-100N,100n,C1,1,buyer,assembler,',
  'JACK,,J1 J2,2,buyer,maker,R-10K',
].join('\n')

test('a list is looked at, saved when confirmed, and gone then', async () => {
  const id = await start(LIST)
  const preview = await look(id)
  expect(preview).toMatchObject({ lines: 3, problems: [], unchanged: 0, delimiter: 'comma' })
  expect(preview.changes.map(({ code, what }) => [code, what])).toEqual([
    ['R-10K', 'added'],
    ['C-100N', 'added'],
    ['JACK', 'added'],
  ])
  // Nobody quotes any of the three: line 2, 3 and 4 of the file.
  expect(preview.findings.filter(({ problem }) => problem === 'no_quote').map(({ line }) => line)).toEqual([
    2, 3, 4,
  ])
  expect(await lineCount()).toBe(0)
  expect(await confirm(id)).toEqual(ok({ module: 'rowlock', revision: 'A', lines: 3 }))
  expect(await lineCount()).toBe(3)
  expect(await PartAlternate.count({ where: { workshopId: at.workshopId } })).toBe(1)
  expect(await confirm(id)).toEqual(refuse('not_found'))
})

test('sent again with differences, it says what is added, removed and changed', async () => {
  const id = await start(
    LIST.replace('R1-R4,4', 'R1-R5,5').replace(
      'C-100N,100n,C1,1,buyer,assembler,',
      'D-1N,,D1,1,buyer,maker,',
    ),
  )
  const { changes, unchanged } = await look(id)
  expect(unchanged).toBe(1)
  expect(changes).toEqual([
    {
      code: 'R-10K',
      what: 'changed',
      fields: [
        { name: 'per_unit', before: '4', after: '5' },
        { name: 'designators', before: 'R1-R4', after: 'R1-R5' },
      ],
    },
    { code: 'D-1N', what: 'added', fields: [] },
    { code: 'C-100N', what: 'removed', fields: [] },
  ])
  expect(await confirm(id)).toMatchObject({ ok: true })
})

test.each<[string, string, number | null, string, RegExp]>([
  ['a part without a code', LIST.replace('JACK,', ','), 4, 'code', /code/],
  ['half a piece', LIST.replace('J2,2,', 'J2,1.5,'), 4, 'per_unit', /whole number/],
  ['a formula', LIST.replace('C-100N,100n', 'C-100N,=A1'), 3, 'value', /formula/],
  ['a part twice', `${LIST}\nJACK,,J3,1,buyer,maker,`, 5, 'code', /twice/],
  ['a helper nobody knows', LIST.replace('buyer,maker', 'buyer,robot'), 4, 'built', /assembler, maker/],
  ['more cells than headings', `${LIST}\nX,1,J9,1,buyer,maker,,surplus`, 5, '', /8 cells/],
  ['no column for pieces', LIST.replace('per_unit', 'footprint'), null, 'per_unit', /No column/],
])('%s is said at its line, and nothing can be saved', async (_, text, line, column, words) => {
  const id = await start(text)
  const { problems } = await look(id)
  expect(problems).toContainEqual({ line, column, words: expect.stringMatching(words) })
  const before = await lineCount()
  expect(await confirm(id)).toEqual(refuse('import_has_mistakes'))
  expect(await lineCount()).toBe(before)
})

test('columns, separator and encoding are put right by hand', async () => {
  const id = await start(Buffer.from('Teil;Menge;Wert\nR-µ;3;10k\n', 'latin1'))
  const preview = await look(id)
  expect(preview).toMatchObject({ encoding: 'windows-1252', delimiter: 'semicolon' })
  expect(preview.problems.map(({ column }) => column)).toEqual(['code', 'per_unit'])
  const settings = { import: id, encoding: 'windows-1252', delimiter: 'semicolon' }
  const placedBy = { boards: '', kit: 'buyer', built: 'maker' }
  const input = ImportSettings.parse({ ...settings, columns: ['code', 'per_unit', 'value'], placedBy })
  expect(await setImport({ actor: at.actor, workshopId: at.workshopId, input })).toEqual(ok({ import: id }))
  const after = await look(id)
  expect(after.problems).toEqual([])
  expect(after.shown[0]?.cells).toEqual(['R-µ', '3', '10k'])
})

test('a column mapped twice is said at the second one', () => {
  const given = { import: world.run.id, encoding: 'utf-8', delimiter: 'comma' }
  const read = ImportSettings.safeParse({ ...given, columns: ['code', 'value', 'code'] })
  expect(read.error?.issues.map(({ path }) => path.join('.'))).toEqual(['columns.2'])
})

test('quotes are added to parts, several to one, and corrected when sent again', async () => {
  const quotes = [
    'code,supplier,currency,moq,multiple,breaks,quoted_on,lead_days',
    'R-10K,Brasswick,EUR,100,100,100: 0.012; 1000: 0.006,2027-02-20,5',
    'R-10K,Northmole,USD,1,1,1: 0.05,2027-02-21,',
  ].join('\n')
  const id = await start(quotes, 'quotes')
  expect(await look(id)).toMatchObject({ lines: 2, problems: [] })
  expect(await confirm(id)).toMatchObject({ ok: true })
  expect(await confirm(await start(quotes, 'quotes'))).toMatchObject({ ok: true })
  const part = await Part.findOne({ where: { code: 'R-10K' }, rejectOnEmpty: true })
  const kept = await Quote.findAll({ where: { partId: part.id }, order: [['supplier', 'ASC']] })
  expect(kept.map(({ supplier, currency, moq }) => [supplier, currency, moq])).toEqual([
    ['Brasswick', 'EUR', 100],
    ['Northmole', 'USD', 1],
  ])
})

test.each<[string, string, string]>([
  ['of a part nobody has', 'ZZZ,Brasswick,EUR,1: 0.1,2027-02-20', 'code'],
  ['with its quantities out of order', 'R-10K,Brasswick,EUR,100: 0.1; 1: 0.2,2027-02-20', 'breaks'],
  ['without a day', 'R-10K,Brasswick,EUR,1: 0.1,', 'supplier'],
])('a quote %s is said at its line', async (_, line, column) => {
  const id = await start(`code,supplier,currency,breaks,quoted_on\n${line}`, 'quotes')
  expect((await look(id)).problems).toContainEqual({ line: 2, column, words: expect.any(String) })
})

test('five thousand lines are read, shown in part and saved', { timeout: 60_000 }, async () => {
  const many = Array.from({ length: 5000 }, (_, i) => `R-${i},10k,R${i + 1},1`)
  const id = await start(['code,value,designators,per_unit', ...many].join('\n'))
  const preview = await look(id)
  expect(preview.lines).toBe(5000)
  expect(preview.shown.length).toBeLessThanOrEqual(200)
  expect(await confirm(id)).toMatchObject({ value: { lines: 5000 } })
  expect(await lineCount()).toBe(5000)
  const over = await start(['code,per_unit', ...many.map((_, i) => `X-${i},1`), 'Y,1'].join('\n'))
  expect((await look(over)).problems).toMatchObject([{ words: expect.stringMatching(/5000/) }])
})

test('a file nobody confirmed is gone after a day; strangers never see it', async () => {
  const id = await start(LIST)
  const stranger = await actorOf(world.fenLamp.owner)
  expect(await getPartImport({ ...at, actor: stranger, id })).toBeNull()
  const theirs = { actor: stranger, workshopId: world.fenLamp.workshop.id }
  expect(await confirmImport({ ...theirs, importId: id, now: NOW })).toEqual(refuse('not_found'))
  const input = ImportStart.parse({ revision: 'A', text: LIST })
  await startImport({ ...at, input, file: null, now: hoursAfter(NOW, 25) })
  expect(await PartImport.count({ where: { id } })).toBe(0)
  const nothing = ImportStart.parse({ revision: 'A', text: '' })
  expect(await startImport({ ...at, input: nothing, file: null, now: NOW })).toMatchObject({
    errors: { text: expect.any(String) },
  })
})
