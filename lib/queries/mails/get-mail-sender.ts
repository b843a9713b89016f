import 'server-only'
import { type Transaction } from 'sequelize'
import { type MailSender } from '@/lib/contracts/mails'
import { formatAddress } from '@/lib/core/post/address'
import { Person, Workshop } from '@/models'

const PLATFORM: MailSender = {
  workshop: 'Brimline',
  maker: 'Brimline',
  replyTo: null,
  postalAddress: [],
  timeZone: 'UTC',
}

/**
 * Who signs the mails of a workshop: the person who started it, with the workshop's answer address and postal
 * address. Brimline itself where there is no workshop.
 */
export async function getMailSender(workshopId: string | null, tx?: Transaction): Promise<MailSender> {
  const row = workshopId && (await Workshop.findByPk(workshopId, { transaction: tx ?? null }))
  if (!row) return PLATFORM
  const maker = await Person.findByPk(row.createdByPersonId, {
    attributes: ['name'],
    transaction: tx ?? null,
  })
  return {
    workshop: row.name,
    maker: maker?.name ?? row.name,
    replyTo: row.replyTo,
    postalAddress: linesOf(row),
    timeZone: row.timeZone,
  }
}

/** Posted from nowhere, so that the country stands in it: readers are abroad. */
function linesOf({ legalName, postalAddress }: Workshop): string[] {
  const lines = postalAddress ? formatAddress(postalAddress, { script: 'latin', from: '' }) : []
  return legalName && !lines.includes(legalName) ? [legalName, ...lines] : lines
}
