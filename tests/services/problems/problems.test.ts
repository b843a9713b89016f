import { beforeEach, describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { getParcelPapers } from '@/lib/queries/packing/get-parcel-papers'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { listOrderProblems, listProblems } from '@/lib/queries/problems/list-problems'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { answerProblem } from '@/lib/services/problems/answer-problem'
import { reportProblem } from '@/lib/services/problems/report-problem'
import { MailOutbox, Parcel, Problem, Refund } from '@/models'
import { elsewhere, packingWorld } from '@/tests/services/packing/packing-world'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'

let world: Awaited<ReturnType<typeof packingWorld>>
beforeEach(async () => {
  world = await packingWorld()
})

type Made = Awaited<ReturnType<typeof world.queued>>
const send = async ({ parcel, lines }: Pick<Made, 'parcel' | 'lines'>) => {
  const at = { actor: world.packer, workshopId: world.workshopId, parcelId: parcel.id, now: NOW }
  const packed = await packParcel({
    ...at,
    input: {
      lines: lines.map(({ id, quantity }) => ({ line: id, quantity })),
      grams: parcel.expectedGrams ?? 400,
    },
  })
  if (!packed.ok) throw new Error(packed.reason)
  const gone = await handOverParcel({ ...at, input: { service: 'Letter' } })
  if (!gone.ok) throw new Error(gone.reason)
}
const posted = async () => {
  const made = await world.queued(undefined, { country: 'US' })
  await send(made)
  return { ...made, buyer: await actorOf(made.person) }
}
type Posted = Awaited<ReturnType<typeof posted>>
const report = ({ buyer, order }: Pick<Posted, 'buyer' | 'order'>, kind: 'lost' | 'fault' = 'lost') =>
  reportProblem({ actor: buyer, orderId: order.id, input: { kind, story: 'It never came.' }, now: NOW })
const problemOf = async (made: Posted, kind?: 'lost' | 'fault') => {
  const opened = await report(made, kind)
  if (!opened.ok) throw new Error(opened.reason)
  return opened.value.problem
}
const answer = async (problemId: string, over: object) =>
  answerProblem({
    ...{ actor: await actorOf(world.owner), workshopId: world.workshopId, problemId, now: NOW },
    input: { remedy: 'message', answer: 'We are sorry.', ...over } as never,
  })

test('a buyer reports what was posted, hears by a day they are told, and reports the same once', async () => {
  const made = await posted()
  // Five days after 1 March 2027.
  expect(await report(made)).toMatchObject(ok({ answerBy: '2027-03-06' }))
  expect(await report(made)).toEqual(refuse('problem_open'))
  expect(await listOrderProblems(made.order.id)).toMatchObject([
    { kind: 'lost', state: 'open', story: 'It never came.', answerBy: '2027-03-06' },
  ])
  expect(await MailOutbox.count({ where: { kind: 'problem_opened', personId: made.order.personId } })).toBe(1)
  const waiting = await world.queued()
  expect(await report({ order: waiting.order, buyer: await actorOf(waiting.person) })).toEqual(
    refuse('nothing_posted'),
  )
  expect(await report({ order: made.order, buyer: (await elsewhere()).actor })).toEqual(refuse('not_found'))
})

test('a lost parcel becomes a replacement: queued, declared at its true value, packed and sent without a second sale', async () => {
  const made = await posted()
  const problem = await problemOf(made)
  expect(await answer(problem, { remedy: 'replacement' })).toMatchObject(ok({ state: 'answered' }))
  expect(await made.parcel.reload()).toMatchObject({ state: 'lost', lostAt: NOW })
  const { items } = await listPackQueue({ actor: world.packer, workshopId: world.workshopId })
  expect(items.map(({ number }) => number)).toEqual([String(made.order.number)])
  const parcel = await Parcel.findOne({ where: { problemId: problem }, rejectOnEmpty: true })
  const asked = { actor: world.packer, workshopId: world.workshopId, parcelIds: [parcel.id], now: NOW }
  const [paper] = (await getParcelPapers(asked))!.parcels
  const each = made.lines[0]!.unitPriceMinor + made.lines[0]!.unitSurchargeMinor
  expect(paper).toMatchObject({ isReplacement: true, customs: { valueMinor: each } })
  expect(each).toBeGreaterThan(0)
  await send({ parcel, lines: made.lines })
  expect(await made.order.reload()).toMatchObject({ state: 'posted' })
  expect(await parcel.reload()).toMatchObject({ state: 'handed_over' })
  expect(await answer(problem, { remedy: 'replacement' })).toEqual(refuse('not_allowed'))
  expect(await Parcel.count({ where: { problemId: problem } })).toBe(1)
})

describe('money', () => {
  test('a part refund needs a sum that was paid, and nothing is left of one that was not', async () => {
    const made = await posted()
    const problem = await problemOf(made, 'fault')
    expect(await answer(problem, { remedy: 'part_refund' })).toMatchObject({
      errors: { refundMinor: 'Enter the sum you pay back, above zero.' },
    })
    expect(await answer(problem, { remedy: 'part_refund', refundMinor: 99_999_999 })).toMatchObject({
      errors: { refundMinor: 'So much was not paid, or is not left to pay back. Enter less.' },
    })
    expect(await Refund.count({ where: { orderId: made.order.id } })).toBe(0)
    expect(await Problem.findByPk(problem)).toMatchObject({ state: 'open', remedy: null })
  })

  test('a disputed order gets no money beside the bank’s', async () => {
    const made = await posted()
    const problem = await problemOf(made, 'fault')
    await made.order.update({ disputedAt: NOW })
    expect(await answer(problem, { remedy: 'full_refund' })).toEqual(refuse('order_disputed'))
  })
})

test('packers and strangers neither read nor answer', async () => {
  const made = await posted()
  const problemId = await problemOf(made)
  const asked = { workshopId: world.workshopId }
  expect(await listProblems({ actor: world.packer, ...asked })).toEqual([])
  expect(await listProblems({ actor: await actorOf(world.owner), ...asked })).toHaveLength(1)
  const input = { remedy: 'message', answer: 'No.' } as const
  expect(await answerProblem({ actor: world.packer, ...asked, problemId, input, now: NOW })).toEqual(
    refuse('forbidden'),
  )
  const stranger = await elsewhere()
  const theirs = { actor: stranger.actor, workshopId: stranger.workshopId, problemId, input, now: NOW }
  expect(await answerProblem(theirs)).toEqual(refuse('not_found'))
})
