import 'server-only'
import type { Transaction } from 'sequelize'
import { pageChanged } from '@/lib/db/page-changed'
import { paths } from '@/lib/paths'
import { Module, type Workshop } from '@/models'

/**
 * Says that every public page of a workshop shows old facts: its front and the page of each module.
 * Locks: nothing. Writes: notifications, sent at commit. Repeat: safe.
 */
export async function workshopPagesChanged(tx: Transaction, workshop: Workshop): Promise<void> {
  const modules = await Module.findAll({
    where: { workshopId: workshop.id },
    attributes: ['slug'],
    transaction: tx,
  })
  for (const { slug } of modules) await pageChanged(tx, paths.module(workshop.slug, slug))
  await pageChanged(tx, paths.workshop(workshop.slug))
  await pageChanged(tx, paths.home)
}
