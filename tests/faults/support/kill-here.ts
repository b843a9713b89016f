import { vi } from 'vitest'
import { forgetEnv } from '@/lib/config/env'
import type { CrashPoint } from '@/lib/db/crash-points'
import { breakStatements, cutConnections } from './break-database'

class Killed extends Error {}

/**
 * Runs something as a process that is killed at a crash point: its connections are cut, and whatever still runs of it
 * reaches no database any more. Answers null when it was killed, else what it answered.
 */
export async function killAt<T>(point: CrashPoint, run: () => Promise<T>): Promise<T | null> {
  let isDead = false
  let isCut: Promise<unknown> | undefined
  breakStatements(() => (isDead ? 'before' : null))
  process.env.CRASH_AT = point
  forgetEnv()
  const kill = vi.spyOn(process, 'kill').mockImplementation(() => {
    isDead = true
    isCut = cutConnections()
    throw new Killed(point)
  })
  try {
    const answer = await run()
    return isDead ? null : answer
  } catch (error) {
    if (!isDead) throw error
    return null
  } finally {
    kill.mockRestore()
    await isCut
    breakStatements(null)
    delete process.env.CRASH_AT
    forgetEnv()
  }
}
