import 'server-only'
import type { Tasks } from '@/lib/jobs/task'
import { due } from './due'
import { evictPages } from './evict-pages'
import { sendMail } from './send-mail'

/** The handler of every job. */
export const TASKS: Tasks = {
  due,
  evict_pages: evictPages,
  send_mail: sendMail,
}
