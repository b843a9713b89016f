import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { getTaxReport } from '@/lib/queries/money/get-tax-report'
import { getInvoicePaper } from '@/lib/queries/invoices/get-invoice-paper'
import { cancelOrder } from '@/lib/services/orders/cancel-order'
import { resolveStuck } from '@/lib/services/money/resolve-stuck'
import { setAddress } from '@/lib/services/orders/set-address'
import { payOrder } from '@/lib/services/payments/pay-order'
import { askBalances } from '@/lib/services/runs/ask-balances'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import { Invoice, MailOutbox, type Order, OrderLine, Parcel, Refund, TaxRate } from '@/models'
import { runJobs } from '@/tests/support/run-jobs'
import { setBusinessTime } from '@/tests/support/business-time'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { booksOf, CARD, moneyWorld, pay, reserved, settleAll } from '@/tests/support/worlds/money'
import { actorOf } from '@/tests/support/worlds/person'

// By hand: a kit of 95.00 holds 15.17 of tax at 19 %, postage of 4.90 holds 0.78; together 99.90 and 15.95. The deposit of
// 25.00 holds 1595 · 2500 / 9990 = 399.1, so 3.99; the balance of 74.90 the rest, 11.96.
let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld({ maximum: 20 })
  await world.workshop.update({ depositsTaxed: true })
})
afterAll(closeSandboxPool)

const papersOf = async (order: Order) =>
  (
    await Invoice.findAll({
      where: { orderId: order.id },
      order: [
        ['series', 'DESC'],
        ['number', 'ASC'],
      ],
    })
  ).map(({ kind, number, grossMinor, taxMinor }) => ({ kind, number, gross: grossMinor, tax: taxMinor }))

async function paid() {
  const made = await reserved(world.run)
  await world.run.update({ state: 'locked', lockedAt: NOW })
  await askBalances({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    now: NOW,
  })
  await runJobs()
  const link = await payOrder({ actor: made.actor, orderId: made.order.id, now: NOW })
  if (!link.ok) throw new Error(link.reason)
  await pay(link.value.payUrl)
  await settleAll()
  await made.order.reload()
  return made
}

async function post(order: Order) {
  const actor = await actorOf(world.owner)
  const workshopId = world.workshop.id
  const parcel = await Parcel.findOne({
    where: { personId: order.personId, state: 'open' },
    rejectOnEmpty: true,
  })
  const lines = await OrderLine.findAll({ where: { orderId: order.id } })
  const input = {
    lines: lines.map(({ id, quantity }) => ({ line: id, quantity })),
    grams: 420,
    weightConfirmed: true,
  }
  const packed = await packParcel({ actor, workshopId, parcelId: parcel.id, input, now: NOW })
  if (!packed.ok) throw new Error(JSON.stringify(packed))
  const gone = await handOverParcel({
    actor,
    workshopId,
    parcelId: parcel.id,
    input: { service: 'Parcel' },
    now: NOW,
  })
  if (!gone.ok) throw new Error(JSON.stringify(gone))
  await order.reload()
}

const report = async () =>
  (await getTaxReport({ actor: await actorOf(world.owner), workshopId: world.workshop.id, now: NOW }))?.rows

/** The tax the papers of every month name is the tax the ledger owes. */
async function expectReportIsLedger() {
  const sum = (await report())?.reduce((total, { taxMinor }) => total + taxMinor, 0)
  expect(sum).toBe(0 - ((await booksOf(world.workshop.id)).tax_payable ?? 0))
}

describe('where tax falls due on arrival', () => {
  test('a deposit has an invoice with its tax, owed from now on', async () => {
    const { order } = await reserved(world.run)
    expect(await papersOf(order)).toEqual([{ kind: 'prepayment', number: 1, gross: 2500, tax: 399 }])
    expect(await booksOf(world.workshop.id)).toMatchObject({ tax_on_deposits: 399, tax_payable: -399 })
    expect(await report()).toEqual([
      { month: '2027-03', country: 'DE', basisPoints: 1900, netMinor: 2101, taxMinor: 399, grossMinor: 2500 },
    ])
  })

  test('cancelling takes it back with a credit note', async () => {
    const { order, actor } = await reserved(world.run)
    await cancelOrder({ actor, orderId: order.id, now: NOW })
    await settleAll()
    expect(await papersOf(order)).toContainEqual({ kind: 'credit_note', number: 1, gross: 2500, tax: 399 })
    const books = await booksOf(world.workshop.id)
    expect(books.tax_payable).toBeUndefined()
    expect(books.tax_on_deposits).toBeUndefined()
    await expectReportIsLedger()
  })

  test('at the posting the final invoice takes both payments off and charges nothing twice', async () => {
    const { order } = await paid()
    expect(order.state).toBe('paid')
    await post(order)
    expect(await papersOf(order)).toEqual([
      { kind: 'prepayment', number: 1, gross: 2500, tax: 399 },
      { kind: 'prepayment', number: 2, gross: 7490, tax: 1196 },
      { kind: 'final', number: 3, gross: 9990, tax: 1595 },
    ])
    const final = await Invoice.findOne({ where: { orderId: order.id, kind: 'final' }, rejectOnEmpty: true })
    expect(final.lines.reduce((sum, { grossMinor }) => sum + grossMinor, 0)).toBe(0)
    expect(final.lines.reduce((sum, { taxMinor }) => sum + taxMinor, 0)).toBe(0)
    const books = await booksOf(world.workshop.id)
    expect(books).toMatchObject({ tax_payable: -1595, sales: -8395 })
    expect(books.tax_on_deposits).toBeUndefined()
    await expectReportIsLedger()
  })

  test('the mail of a paid balance leads to its invoice', async () => {
    const { order } = await paid()
    const invoice = await Invoice.findOne({ where: { orderId: order.id, number: 2 }, rejectOnEmpty: true })
    const mail = await MailOutbox.findOne({
      where: { kind: 'balance_paid', personId: order.personId },
      rejectOnEmpty: true,
    })
    expect((mail.props as { invoiceUrl: string }).invoiceUrl).toContain(`/api/invoices/${invoice.id}/`)
  })

  test('an order that goes to another country is taken back and invoiced at its rate', async () => {
    await world.workshop.update({ taxMode: 'destination_rate' })
    await TaxRate.findOrCreate({
      where: { workshopId: null, country: 'AT', basisPoints: 2000, validFrom: '2016-01-01' },
    })
    const { order, actor } = await reserved(world.run)
    const address = { country: 'AT', name: 'A. Berg', lines: ['Ring 1'], postcode: '1010', city: 'Wien' }
    expect(await setAddress({ actor, orderId: order.id, address, now: NOW })).toMatchObject({ ok: true })
    const papers = await Invoice.findAll({
      where: { orderId: order.id },
      order: [
        ['series', 'DESC'],
        ['number', 'ASC'],
      ],
    })
    // 2500 · 20 / 120 = 416.7, but half-up per line first: 95.00 holds 15.83, postage of 9.90 holds 1.65; 1748 · 2500 / 10490.
    expect(papers.map(({ kind, taxCountry, taxMinor }) => [kind, taxCountry, taxMinor])).toEqual([
      ['prepayment', 'DE', 399],
      ['prepayment', 'AT', 417],
      ['credit_note', 'DE', 399],
    ])
    await expectReportIsLedger()
    expect(await report()).toContainEqual({
      month: '2027-03',
      country: 'DE',
      basisPoints: 1900,
      netMinor: 0,
      taxMinor: 0,
      grossMinor: 0,
    })
  })

  test('a refund that fails and is sent again has one credit note', async () => {
    const { order, actor } = await reserved(world.run, {}, CARD.refundFails)
    await cancelOrder({ actor, orderId: order.id, now: NOW })
    await settleAll()
    await setBusinessTime(hoursAfter(NOW, 25))
    await passTime()
    await settleAll()
    const failed = await Refund.findOne({
      where: { orderId: order.id, state: 'failed' },
      rejectOnEmpty: true,
    })
    const input = { kind: 'refund', id: failed.id } as const
    const again = { actor: await actorOf(world.owner), workshopId: world.workshop.id, input, now: NOW }
    expect(await resolveStuck(again)).toMatchObject({ ok: true })
    await settleAll()
    expect(await Refund.count({ where: { orderId: order.id } })).toBe(2)
    expect((await papersOf(order)).filter(({ kind }) => kind === 'credit_note')).toHaveLength(1)
    await expectReportIsLedger()
  })

  test('numbers have no gap when payments arrive together', async () => {
    for (let i = 0; i < 4; i += 1) await reserved(world.run)
    const numbers = (await Invoice.findAll({ where: { workshopId: world.workshop.id } })).map(
      ({ number }) => number,
    )
    expect(numbers.sort((a, b) => a - b)).toEqual([1, 2, 3, 4])
  })
})

describe('where tax falls due with the posting', () => {
  test('a deposit’s invoice names none, and the report begins with the posting', async () => {
    await world.workshop.update({ depositsTaxed: false })
    const { order } = await paid()
    expect((await papersOf(order)).map(({ tax }) => tax)).toEqual([0, 0])
    expect(await report()).toEqual([])
    await post(order)
    expect(await report()).toEqual([
      {
        month: '2027-03',
        country: 'DE',
        basisPoints: 1900,
        netMinor: 8395,
        taxMinor: 1595,
        grossMinor: 9990,
      },
    ])
    await expectReportIsLedger()
  })
})

describe('who may read a paper', () => {
  test('its buyer and its owner, nobody else', async () => {
    const mine = await reserved(world.run)
    const other = await reserved(world.run)
    const invoice = await Invoice.findOne({ where: { orderId: mine.order.id }, rejectOnEmpty: true })
    const ask = async (actor: typeof mine.actor) =>
      (await getInvoicePaper({ actor, invoiceId: invoice.id }))?.number ?? null
    expect(await ask(mine.actor)).toBe(1)
    expect(await ask(await actorOf(world.owner))).toBe(1)
    expect(await ask(other.actor)).toBeNull()
  })
})
