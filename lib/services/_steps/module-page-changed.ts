import 'server-only'
import type { Transaction } from 'sequelize'
import { pageChanged } from '@/lib/db/page-changed'
import { paths } from '@/lib/paths'
import { Module, Workshop } from '@/models'

/**
 * Says that a module's public page, its workshop's front and the front of the site show old counts.
 * Locks: nothing. Writes: three notifications, sent at commit. Repeat: safe.
 */
export async function modulePageChanged(tx: Transaction, moduleId: string): Promise<void> {
  const module = await Module.findByPk(moduleId, {
    attributes: ['slug', 'workshopId'],
    transaction: tx,
    rejectOnEmpty: true,
  })
  const workshop = await Workshop.findByPk(module.workshopId, {
    attributes: ['slug'],
    transaction: tx,
    rejectOnEmpty: true,
  })
  await pageChanged(tx, paths.module(workshop.slug, module.slug))
  await pageChanged(tx, paths.workshop(workshop.slug))
  await pageChanged(tx, paths.home)
}
