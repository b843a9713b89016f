import { vi } from 'vitest'
import { forgetEnv } from '@/lib/config/env'
import type { CrashPoint } from '@/lib/db/crash-points'

class Crashed extends Error {}

/**
 * Runs something as a process that is killed at a crash point: from there on nothing more of it happens, and a
 * transaction that is open is rolled back. Throws when the point is never reached.
 */
export async function crashAt(point: CrashPoint, run: () => Promise<unknown>): Promise<void> {
  process.env.CRASH_AT = point
  forgetEnv()
  const kill = vi.spyOn(process, 'kill').mockImplementation(() => {
    throw new Crashed(point)
  })
  try {
    await run()
    throw new Error(`${point} was never reached`)
  } catch (error) {
    if (!(error instanceof Crashed)) throw error
  } finally {
    kill.mockRestore()
    delete process.env.CRASH_AT
    forgetEnv()
  }
}
