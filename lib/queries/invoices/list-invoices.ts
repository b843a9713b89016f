import 'server-only'
import { Op } from 'sequelize'
import type { InvoiceListItem } from '@/lib/contracts/money-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { Invoice, Order } from '@/models'

const PAGE = 50

/**
 * A workshop's numbered papers, newest first, a page at a time, of one run when asked; empty for who may not see them. One
 * statement. `next` is handed back as `before`.
 */
export async function listInvoices(asked: {
  actor: Actor
  workshopId: string
  runId?: string | undefined
  before?: string | undefined
}): Promise<{ items: InvoiceListItem[]; next: string | null }> {
  const { actor, workshopId, runId, before } = asked
  if (!can(actor, 'money:read', { workshopId })) return { items: [], next: null }
  const [at, id] = before?.split('_') ?? []
  const isMark = at !== undefined && id !== undefined && !Number.isNaN(Date.parse(at))
  const issuedAt = new Date(isMark ? at : 0)
  const older = isMark
    ? { [Op.or]: [{ issuedAt: { [Op.lt]: issuedAt } }, { issuedAt, id: { [Op.lt]: id } }] }
    : {}
  const rows = await Invoice.findAll({
    where: { workshopId, ...older },
    include: [
      {
        model: Order,
        as: 'order',
        attributes: ['id', 'number', 'runId'],
        required: true,
        ...(runId === undefined ? {} : { where: { runId } }),
      },
    ],
    order: [
      ['issuedAt', 'DESC'],
      ['id', 'DESC'],
    ],
    limit: PAGE + 1,
  })
  const shown = rows.slice(0, PAGE)
  const last = shown.at(-1)
  return {
    items: shown.map((row) => ({
      id: row.id,
      kind: row.kind,
      number: row.number,
      issuedOn: row.issuedOn,
      grossMinor: row.grossMinor,
      taxMinor: row.taxMinor,
      currency: row.currency,
      order: row.orderId,
      orderNumber: row.order?.number ?? 0,
    })),
    next: rows.length > PAGE && last ? `${last.issuedAt.toISOString()}_${last.id}` : null,
  }
}
