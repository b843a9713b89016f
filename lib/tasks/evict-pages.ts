import 'server-only'
import { announcePages } from '@/lib/jobs/announce-pages'
import type { Task } from '@/lib/jobs/task'

/** For pages that change by time alone, without a service that says so. */
export const evictPages: Task<'evict_pages'> = ({ paths }) => announcePages(paths)
