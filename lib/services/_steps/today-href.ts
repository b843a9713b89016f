import 'server-only'
import type { TodayItem } from '@/lib/contracts/today'
import { paths } from '@/lib/paths'

/** The one place where a thing that needs the owner is dealt with. */
export function todayHref(slug: string, item: TodayItem): string {
  switch (item.what) {
    case 'decide_soon':
      return paths.adminRun(slug, item.run.id)
    case 'ready_to_lock':
      return paths.adminRunDeed(slug, item.run.id, 'lock')
    case 'balances_failed':
      return `${paths.adminRunPage(slug, item.run.id, 'orders')}?state=balance_due`
    case 'problems_open':
      return paths.adminProblems(slug)
    case 'notices_due':
    case 'disputes':
    case 'refunds_waiting':
      return paths.adminRunPage(slug, item.run.id, 'orders')
    case 'quotes_old':
      return paths.adminModulePage(slug, item.run.slug, 'parts')
    case 'parts_late':
      return paths.adminRun(slug, item.run.id)
    case 'mails_bounced':
      return paths.adminRuns(slug)
    case 'parcels_ready':
      return paths.packing(slug)
  }
}
