import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { Membership } from '@/models'

/** Whether a workshop would be left without an owner if this membership ended or changed. The caller holds the workshop. */
export async function isLastOwner(tx: Transaction, membership: Membership): Promise<boolean> {
  const owns = { workshopId: membership.workshopId, role: 'owner' as const, endedAt: null }
  const [self, others] = await Promise.all([
    Membership.count({ where: { ...owns, id: membership.id }, transaction: tx }),
    Membership.count({ where: { ...owns, id: { [Op.ne]: membership.id } }, transaction: tx }),
  ])
  return self > 0 && others === 0
}
