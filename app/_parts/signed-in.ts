import { redirect } from 'next/navigation'
import { currentActor } from '@/lib/auth/actor'
import type { Actor } from '@/lib/core/policy/can'
import { paths } from '@/lib/paths'

/** The person looking at this page; a visitor is sent to sign in and comes back here. */
export async function signedIn(here: string): Promise<Extract<Actor, { kind: 'person' }>> {
  const actor = await currentActor()
  if (actor.kind === 'visitor') redirect(paths.signIn(here))
  return actor
}
