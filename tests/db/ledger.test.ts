import { randomUUID } from 'node:crypto'
import { Client } from 'pg'
import { beforeAll, describe, expect, test } from 'vitest'
import { databaseUrl } from '@/lib/config/env'
import { minor } from '@/lib/core/brand'
import { balancePaid, depositPaid, type Entry } from '@/lib/core/ledger/entries'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { Invoice, LedgerEntry, LedgerTransfer, type Workshop } from '@/models'
import { NOW } from '../support/worlds/base'
import { makeOrder } from '../support/worlds/order'
import { makeRun } from '../support/worlds/run'
import { makeWorkshop } from '../support/worlds/workshop'
import { refusedBy } from './refused-by'

let workshop: Workshop
beforeAll(async () => {
  workshop = (await makeWorkshop()).workshop
})

function post(entries: readonly Entry[], sourceId: string = randomUUID()) {
  return inTransaction(async (tx) => {
    const workshopId = workshop.id
    const transfer = await LedgerTransfer.create(
      { workshopId, source: 'payment_attempt', sourceId, kind: 'deposit_paid', at: NOW },
      { transaction: tx },
    )
    await LedgerEntry.bulkCreate(
      entries.map(({ account, currency, amount }, position) => ({
        workshopId,
        transferId: transfer.id,
        account,
        currency,
        amountMinor: amount,
        position,
      })),
      { transaction: tx },
    )
    // What commit does anyway, as a statement: a refused commit costs the connection.
    await sequelize.query('set constraints all immediate', { transaction: tx })
    return ok(transfer)
  })
}

const entry = (account: Entry['account'], amount: number, currency = 'EUR'): Entry => ({
  account,
  currency,
  amount: minor(amount),
})

describe('a transfer', () => {
  test('of the core’s entries is accepted', async () => {
    const posted = await post(depositPaid({ amount: 2500, currency: 'EUR' }))
    expect(posted.ok).toBe(true)
    await post(balancePaid({ amount: 16400, currency: 'EUR', taxNow: 2618 }))
  })

  test('that does not sum to zero in each currency is refused, and nothing of it stays', async () => {
    const before = await LedgerTransfer.count()
    const oneCent = () => post([entry('provider_balance', 2500), entry('customer_deposits', -2499)])
    expect(await refusedBy(oneCent)).toBe('ledger_entries_balanced')
    const mixed = () =>
      post([entry('provider_balance', 2500, 'EUR'), entry('customer_deposits', -2500, 'USD')])
    expect(await refusedBy(mixed)).toBe('ledger_entries_balanced')
    expect(await refusedBy(() => post([]))).toBe('ledger_transfers_balanced')
    expect(await LedgerTransfer.count()).toBe(before)
  })

  test('is weighed at commit at the latest', async () => {
    const client = new Client({ connectionString: databaseUrl() })
    await client.connect()
    await client.query('begin')
    await client.query(
      `insert into ledger_transfers (workshop_id, source, source_id, kind, at) values ($1, 'test', '1', 'one_sided', now())`,
      [workshop.id],
    )
    await expect(client.query('commit')).rejects.toThrow('has 0 entries')
    await client.end()
    expect(await LedgerTransfer.count({ where: { kind: 'one_sided' } })).toBe(0)
  })

  test('may be in two currencies when each sums to zero', async () => {
    await post([
      entry('provider_balance', 2500, 'EUR'),
      entry('customer_deposits', -2500, 'EUR'),
      entry('provider_balance', 90, 'USD'),
      entry('processing_fees', -90, 'USD'),
    ])
  })

  test('has no entry of nothing', async () => {
    const empty = () => post([entry('provider_balance', 0), entry('customer_deposits', 0)])
    expect(await refusedBy(empty)).toBe('ledger_entries_amount_not_zero_check')
  })

  test('is booked once per cause', async () => {
    const cause = randomUUID()
    await post(depositPaid({ amount: 2500, currency: 'EUR' }), cause)
    const again = () => post(depositPaid({ amount: 2500, currency: 'EUR' }), cause)
    expect(await refusedBy(again)).toBe('ledger_transfers_source_source_id_kind_key')
  })

  test('cannot be unbalanced later by one more entry', async () => {
    const posted = await post(depositPaid({ amount: 2500, currency: 'EUR' }))
    if (!posted.ok) throw new Error('not posted')
    const more = { workshopId: workshop.id, transferId: posted.value.id, currency: 'EUR', position: 9 }
    const late = () =>
      inTransaction(async (tx) => {
        await LedgerEntry.create({ ...more, account: 'bank', amountMinor: minor(1) }, { transaction: tx })
        await sequelize.query('set constraints all immediate', { transaction: tx })
        return ok(null)
      })
    expect(await refusedBy(late)).toBe('ledger_entries_balanced')
  })
})

test('what is written in the books stays', async () => {
  await post(depositPaid({ amount: 2500, currency: 'EUR' }))
  for (const table of ['ledger_transfers', 'ledger_entries']) {
    const touched = () => sequelize.query(`update ${table} set workshop_id = workshop_id`)
    expect(await refusedBy(touched)).toMatch(/never changed/)
    expect(await refusedBy(() => sequelize.query(`delete from ${table}`))).toMatch(/never changed/)
  }
})

test('invoices have one number each, add up and are never changed', async () => {
  const { run, runOffers, workshop: seller } = await makeRun()
  const { order } = await makeOrder({ run, lines: [{ offer: runOffers.kit, quantity: 1 }] })
  const invoice = {
    workshopId: seller.id,
    kind: 'prepayment',
    series: 'invoice',
    number: 1,
    orderId: order.id,
    currency: 'EUR',
    netMinor: minor(2101),
    taxMinor: minor(399),
    grossMinor: minor(2500),
    taxCountry: 'DE',
    lines: [],
    issuedOn: '2027-03-01',
    issuedAt: NOW,
  } as const
  const made = await Invoice.create({ ...invoice, lines: [] })
  const again = () => Invoice.create({ ...invoice, lines: [] })
  expect(await refusedBy(again)).toBe('invoices_series_number_key')
  const wrong = () => Invoice.create({ ...invoice, lines: [], number: 2, taxMinor: minor(400) })
  expect(await refusedBy(wrong)).toBe('invoices_gross_check')
  const loose = () => Invoice.create({ ...invoice, lines: [], kind: 'credit_note', series: 'credit_note' })
  expect(await refusedBy(loose)).toBe('invoices_corrects_check')
  expect(await refusedBy(() => made.update({ number: 3 }))).toMatch(/never changed/)
})
