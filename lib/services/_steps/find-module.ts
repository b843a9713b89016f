import 'server-only'
import type { Transaction } from 'sequelize'
import { Module, Revision } from '@/models'

/** A module of a workshop by its address, locked for a change; null when there is none. */
export function lockModule(tx: Transaction, workshopId: string, slug: string): Promise<Module | null> {
  return Module.findOne({ where: { workshopId, slug }, transaction: tx, lock: tx.LOCK.UPDATE })
}

/** A revision of a module by its letter, locked for a change; null when there is none. */
export function lockRevision(tx: Transaction, moduleId: string, letter: string): Promise<Revision | null> {
  return Revision.findOne({ where: { moduleId, letter }, transaction: tx, lock: tx.LOCK.UPDATE })
}
