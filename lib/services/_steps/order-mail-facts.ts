import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { paths } from '@/lib/paths'
import { Module, type Order, ProviderCustomer, Run, Workshop } from '@/models'

/**
 * What every mail about an order names: its number, its module and its own page, and what they are read from.
 * Locks: nothing. Writes: nothing.
 */
export async function orderMailFacts(tx: Transaction, order: Order) {
  const run = await Run.findByPk(order.runId, { transaction: tx, rejectOnEmpty: true })
  const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
  const workshop = await Workshop.findByPk(order.workshopId, { transaction: tx, rejectOnEmpty: true })
  return {
    run,
    module,
    workshop,
    moduleUrl: `${env().BASE_URL}${paths.module(workshop.slug, module.slug)}`,
    ofOrder: {
      orderNumber: String(order.number),
      module: module.name,
      orderUrl: `${env().BASE_URL}${paths.accountOrder(order.id)}`,
    },
  }
}

/** The last digits of the buyer's saved card; null while none is saved. */
export async function cardEndingOf(tx: Transaction, order: Order): Promise<string | null> {
  const customer = await ProviderCustomer.findOne({
    where: { workshopId: order.workshopId, personId: order.personId },
    attributes: ['methodLast4'],
    transaction: tx,
  })
  return customer?.methodLast4 || null
}
