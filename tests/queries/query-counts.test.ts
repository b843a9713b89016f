import { beforeAll, describe, expect, test } from 'vitest'
import type { Actor } from '@/lib/core/policy/can'
import { depositPaid } from '@/lib/core/ledger/entries'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { postLedger } from '@/lib/services/_steps/post-ledger'
import { makeAttempt, makeInvoice } from '@/tests/support/worlds/payment'
import { listOwnSignUps } from '@/lib/queries/account/list-own-sign-ups'
import { getBulk } from '@/lib/queries/bulk/get-bulk'
import { listWorkshops } from '@/lib/queries/host/list-workshops'
import { listInvoices } from '@/lib/queries/invoices/list-invoices'
import { getMoneyDesk } from '@/lib/queries/money/get-money-desk'
import { getStatement } from '@/lib/queries/money/get-statement'
import { getTaxReport } from '@/lib/queries/money/get-tax-report'
import { listMembers } from '@/lib/queries/members/list-members'
import { getPartsDesk } from '@/lib/queries/modules-admin/get-parts-desk'
import { listModules } from '@/lib/queries/modules-admin/list-modules'
import { getDemandBoard } from '@/lib/queries/demand/get-demand-board'
import { getInterestBoard } from '@/lib/queries/demand/get-interest-board'
import { listOwnOrders } from '@/lib/queries/orders/list-own-orders'
import { getFulfilmentOrders } from '@/lib/queries/packing/get-fulfilment-orders'
import { listBatches } from '@/lib/queries/packing/list-batches'
import { listPackGroups } from '@/lib/queries/packing/list-pack-groups'
import { listRunUnits } from '@/lib/queries/units/list-run-units'
import { getPackSummary } from '@/lib/queries/packing/get-pack-summary'
import { listProblems } from '@/lib/queries/problems/list-problems'
import { getParcelPapers } from '@/lib/queries/packing/get-parcel-papers'
import { getPackingSlips } from '@/lib/queries/packing/get-packing-slips'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { listPackedParcels } from '@/lib/queries/packing/list-packed-parcels'
import { listStoppedOrders } from '@/lib/queries/packing/list-stopped-orders'
import { getModulePage } from '@/lib/queries/public/get-module-page'
import { getSiteFront } from '@/lib/queries/public/get-site-front'
import { getWorkshopFront } from '@/lib/queries/public/get-workshop-front'
import { getCostDesk } from '@/lib/queries/runs/get-cost-desk'
import { getRunPage } from '@/lib/queries/runs/get-run-page'
import { getSchedule } from '@/lib/queries/runs/get-schedule'
import { getWhatIfs } from '@/lib/queries/runs/get-what-ifs'
import { getTrackRecord } from '@/lib/queries/record/get-track-record'
import { getRunOutcome } from '@/lib/queries/runs/get-run-outcome'
import { listRunOrders } from '@/lib/queries/runs/list-run-orders'
import { listRuns } from '@/lib/queries/runs/list-runs'
import { listToday } from '@/lib/queries/today/list-today'
import { getDesk } from '@/lib/queries/workshops/get-desk'
import { BulkItem, BulkJob, PackBatch, Part, Problem, type Person, RevisionLine } from '@/models'
import { hoursAfter, NOW, serial } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeAddress, makeOrder } from '@/tests/support/worlds/order'
import { makeParcel, makeUnit } from '@/tests/support/worlds/parcel'
import { actorOf, makePerson, makeUser } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

// A list of fifty costs as many statements as a list of five.
type World = Awaited<ReturnType<typeof makeWorld>>
let world: World
let buyer: Person
let people: Record<'owner' | 'buyer' | 'host', Actor>
let bulk: BulkJob
const parcelIds: string[] = []

async function makeWorld() {
  return makeRun(undefined, { maximum: 500, minimum: 3 })
}

/** One more of everything a list shows. */
async function addRow(): Promise<void> {
  const { workshop, module, revision, offers, run, runOffers } = world
  const { workshopId } = run
  const lines = [{ offer: runOffers.kit, quantity: 1 }]
  await makeOrder({ run, lines })
  const own = await makeAddress(workshopId, buyer, { fingerprint: `own-${serial()}` })
  await makeOrder({ run, lines, person: buyer, address: own })
  const paid = await makeOrder({ run, lines }, { state: 'paid' })
  parcelIds.push((await makeParcel(paid.order, paid.lines)).parcel.id)
  const packed = await makeOrder({ run, lines }, { state: 'packed', packedAt: NOW })
  const packedParcel = {
    state: 'packed',
    grams: 420,
    packedAt: NOW,
    packedByPersonId: (world as unknown as { owner: Person }).owner.id,
  } as const
  await makeParcel(packed.order, packed.lines, packedParcel)
  await makeOrder({ run, lines }, { state: 'paid', disputedAt: NOW })
  await makeSignUp(offers.built)
  const other = await makeModule(workshop)
  await makeSignUp(other.offers.kit, { person: buyer })
  await makeRun(
    { workshop, terms: world.terms, ...other },
    { state: 'draft', openedAt: null, opensToAllAt: null },
  )
  await makeUser({ workshopId, role: 'bench' })
  await makeWorkshop()
  await BulkItem.create({
    workshopId,
    bulkJobId: bulk.id,
    subjectId: own.id,
    position: serial(),
    doneAt: null,
    reason: null,
  })
  const part = await Part.create({ workshopId, code: `part-${serial()}`, createdAt: NOW })
  await RevisionLine.create({
    ...{ workshopId, revisionId: revision.id, partId: part.id, position: serial(), perUnit: 1 },
    placedBy: { kit: 'buyer' },
  })
  await PackBatch.create({
    ...{ workshopId, runId: null, name: 'Batch', createdAt: NOW, closedAt: NOW },
    packerPersonId: (world as unknown as { owner: Person }).owner.id,
  })
  await makeUnit(run)
  await Problem.create({
    ...{ workshopId, number: serial(), orderId: paid.order.id, orderLineId: null, parcelId: null },
    ...{ kind: 'fault', story: 'It hums.', remedy: null, answer: null, lessonId: null },
    ...{ openedAt: NOW, answerByOn: '2027-03-06', answeredAt: null, closedAt: null },
  })
  await makeInvoice(paid.order)
  await makeAttempt(paid.order, {
    purpose: `change-${serial()}`,
    state: 'unknown',
    requestedAt: hoursAfter(NOW, -1),
  })
  await inTransaction(async (tx) => {
    const { id: orderId, currency } = paid.order
    const source = {
      workshopId,
      source: 'order',
      sourceId: orderId,
      kind: 'deposit_paid',
      orderId,
      runId: run.id,
    }
    return ok(await postLedger(tx, { ...source, at: NOW, entries: depositPaid({ amount: 2500, currency }) }))
  })
  await module.reload()
}

beforeAll(async () => {
  world = await makeWorld()
  buyer = await makePerson()
  people = {
    owner: await actorOf((world as unknown as { owner: Person }).owner),
    buyer: await actorOf(buyer),
    host: await actorOf(await makePerson(), { host: true }),
  }
  const { workshopId, id: runId } = world.run
  bulk = await BulkJob.create({
    workshopId,
    kind: 'invite',
    runId,
    createdAt: NOW,
    byPersonId: null,
    doneAt: null,
  })
})

/** Statements sent while `work` runs, and what it found. */
async function counted<T>(work: () => Promise<T>): Promise<{ statements: number; found: T }> {
  const { options } = sequelize as unknown as { options: { logging: false | (() => void) } }
  let statements = 0
  options.logging = () => void (statements += 1)
  const found = await work().finally(() => (options.logging = false))
  return { statements, found }
}

const asked = () => ({ actor: people.owner, workshopId: world.workshop.id, now: NOW })
const rowsOf = (found: unknown): number =>
  Array.isArray(found)
    ? found.length
    : Math.max(
        0,
        ...Object.values((found ?? {}) as object)
          .filter(Array.isArray)
          .map((list) => list.length),
      )

/** Each list of a page, and how many rows it shows at most. */
const LISTS: Readonly<
  Record<string, { ask: () => Promise<unknown>; most?: number; rows?: (found: never) => number }>
> = {
  'own orders': { ask: () => listOwnOrders({ actor: people.buyer, now: NOW }), most: 20 },
  'own sign-ups': { ask: () => listOwnSignUps({ actor: people.buyer }) },
  'runs of a workshop': { ask: () => listRuns(asked()), most: 20 },
  'orders of a run': { ask: () => listRunOrders({ ...asked(), runId: world.run.id }) },
  'page of a run': {
    ask: () => getRunPage({ ...asked(), runId: world.run.id, balanceMinor: 0 }),
    rows: ({ orders }: { orders: Record<string, number> }) => orders['reserved'] ?? 0,
  },
  'schedule of a run': {
    ask: () => getSchedule({ ...asked(), runId: world.run.id, slip: null }),
    rows: () => 5,
  },
  'what-ifs of a run': {
    ask: () => getWhatIfs({ ...asked(), runId: world.run.id }),
    rows: () => 5,
  },
  'costs of a run': {
    ask: () => getCostDesk({ ...asked(), runId: world.run.id }),
    rows: () => 5,
  },
  'demand of a run': {
    ask: () => getDemandBoard({ ...asked(), runId: world.run.id }),
    rows: ({ people }: { people: number }) => people,
  },
  'interest in a module': {
    ask: () => getInterestBoard({ ...asked(), module: world.module.slug }),
    rows: ({ people }: { people: number }) => people,
  },
  'outcome of a run': { ask: () => getRunOutcome({ ...asked(), runId: world.run.id }), rows: () => 5 },
  'track record': {
    ask: () => getTrackRecord({ actor: people.owner, slug: world.workshop.slug }),
    rows: () => 5,
  },
  'what needs the owner': {
    ask: () => listToday(asked()),
    rows: (items: { count: number }[]) => Math.max(...items.map(({ count }) => count)),
  },
  'modules of a workshop': { ask: () => listModules(asked()) },
  'parts list': { ask: () => getPartsDesk({ ...asked(), module: world.module.slug }) },
  'people of a workshop': { ask: () => listMembers(asked()) },
  'desk of a workshop': {
    ask: () => getDesk({ actor: people.owner, slug: world.workshop.slug }),
    rows: () => 5,
  },
  'items of a bulk job': {
    ask: () => getBulk({ ...asked(), bulkId: bulk.id }),
    rows: ({ total }: { total: number }) => total,
  },
  'workshops of the host': { ask: () => listWorkshops({ actor: people.host }) },
  'pack queue': { ask: () => listPackQueue(asked()) },
  'contents in the queue': { ask: () => listPackGroups(asked()), rows: () => 5 },
  batches: { ask: () => listBatches(asked()), most: 20 },
  'units of a run': { ask: () => listRunUnits({ ...asked(), runId: world.run.id }) },
  'invoices of a workshop': { ask: () => listInvoices(asked()) },
  'what is stuck': { ask: () => getMoneyDesk(asked()) },
  'statement of a run': { ask: () => getStatement({ ...asked(), runId: world.run.id }) },
  'tax of a year': { ask: () => getTaxReport(asked()), rows: () => 5 },
  'packed parcels': { ask: () => listPackedParcels({ ...asked(), show: 'packed' }) },
  'stopped orders': { ask: () => listStoppedOrders(asked()) },
  'summary of packing': {
    ask: () => getPackSummary(asked()),
    rows: ({ toPack }: { toPack: number }) => toPack,
  },
  'fulfilment list': { ask: () => getFulfilmentOrders(asked()) },
  'packing slips': { ask: () => getPackingSlips({ ...asked(), parcelIds, problemUrl: (id) => id }) },
  'problems of a workshop': { ask: () => listProblems(asked()) },
  'papers of parcels': { ask: () => getParcelPapers({ ...asked(), parcelIds }) },
  'front of a workshop': { ask: () => getWorkshopFront({ slug: world.workshop.slug, now: NOW }) },
  'front of the site': { ask: () => getSiteFront({ now: NOW }) },
  'page of a module': {
    ask: () => getModulePage({ workshop: world.workshop.slug, module: world.module.slug, now: NOW }),
    rows: () => 5,
  },
}

describe('statements per list', () => {
  const atFive: Record<string, number> = {}

  test('at five rows', async () => {
    for (let row = 0; row < 5; row += 1) await addRow()
    for (const [name, { ask, rows = rowsOf }] of Object.entries(LISTS)) {
      const { statements, found } = await counted(ask)
      expect((rows as (each: unknown) => number)(found), `rows of ${name}`).toBeGreaterThanOrEqual(5)
      atFive[name] = statements
    }
    expect(Math.max(...Object.values(atFive)), JSON.stringify(atFive)).toBeLessThanOrEqual(40)
  })

  test('at fifty rows they are as many', { timeout: 120_000 }, async () => {
    for (let row = 5; row < 50; row += 1) await addRow()
    const atFifty: Record<string, number> = {}
    for (const [name, { ask, most = 50, rows = rowsOf }] of Object.entries(LISTS)) {
      const { statements, found } = await counted(ask)
      const shown = (rows as (each: unknown) => number)(found)
      if (shown !== 5) expect(shown, `rows of ${name}`).toBeGreaterThanOrEqual(most)
      atFifty[name] = statements
    }
    expect(atFifty).toEqual(atFive)
  })
})
