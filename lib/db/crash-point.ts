import 'server-only'
import { env } from '@/lib/config/env'
import type { CrashPoint } from './crash-points'

/** Kills this process, without a chance to tidy up, where a test of faults asked for it; does nothing otherwise. */
export function crashPoint(name: CrashPoint): void {
  if (env().CRASH_AT === name) process.kill(process.pid, 'SIGKILL')
}
