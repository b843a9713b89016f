import 'server-only'
import { pageChanged } from '@/lib/db/page-changed'
import { sequelize } from '@/lib/db/sequelize'

/** Tells every web process that these kept pages are out of date; `*` means all of them. */
export async function announcePages(paths: readonly string[]): Promise<void> {
  await sequelize.transaction(async (tx) => {
    for (const path of paths) await pageChanged(tx, path)
  })
}
