import 'server-only'
import type { Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

/** The channel on which web processes hear which kept page is out of date. */
export const PAGE_CHANGED = 'page_changed'

/**
 * Says that a kept public page shows old facts. Sent by the database when the transaction commits, never
 * before, and not at all when it rolls back; every web process then drops its copy.
 */
export async function pageChanged(tx: Transaction, path: string): Promise<void> {
  await sequelize.query('select pg_notify(:channel, :path)', {
    replacements: { channel: PAGE_CHANGED, path },
    transaction: tx,
  })
}
