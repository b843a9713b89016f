import 'server-only'
import { adapter } from '@/lib/auth/adapter'
import { ok } from '@/lib/core/result'

/** Signs one browser out: its session is deleted. Refuses: nothing. Locks: nothing. Repeat: safe. */
export async function endSession(cmd: { token: string }) {
  await adapter.deleteSession!(cmd.token)
  return ok({ ended: true as const })
}
