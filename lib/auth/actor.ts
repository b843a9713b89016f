import 'server-only'
import { cookies } from 'next/headers'
import { cache } from 'react'
import { env } from '@/lib/config/env'
import type { Actor } from '@/lib/core/policy/can'
import { Membership, Person, Session, User } from '@/models'
import { cookieOf, SESSION_COOKIE } from './cookies'
import { hashToken } from '@/lib/config/secrets'

/** How a session made by the sandbox's sign-in is known. */
export const SANDBOX_DEVICE = 'sandbox'

const VISITOR: Actor = { kind: 'visitor' }

/** Who sends this request, and whether it carries a session cookie at all (a stale one still asks for our origin). */
export async function actorOf(request: Request): Promise<{ actor: Actor; hasSession: boolean }> {
  const token = cookieOf(request, SESSION_COOKIE)
  return { actor: token ? await actorByToken(token) : VISITOR, hasSession: token !== undefined }
}

/** Who looks at this page; read once per request. */
export const currentActor = cache(async (): Promise<Actor> => {
  const token = (await cookies()).get(SESSION_COOKIE)?.value
  return token ? actorByToken(token) : VISITOR
})

/** The person whose browser holds this token; a visitor when it is unknown, ended or the person was erased. */
export async function actorByToken(token: string): Promise<Actor> {
  const session = await Session.findOne({
    where: { tokenHash: hashToken(token) },
    include: [
      {
        model: User,
        as: 'user',
        required: true,
        include: [
          {
            model: Person,
            as: 'person',
            required: true,
            include: [{ model: Membership, as: 'memberships', required: false, where: { endedAt: null } }],
          },
        ],
      },
    ],
  })
  const person = session?.user?.person
  if (!session || !person || session.expiresAt.getTime() <= Date.now() || person.emailNormal === null)
    return VISITOR
  return {
    kind: 'person',
    personId: person.id,
    email: person.emailNormal,
    memberships: (person.memberships ?? []).map(({ workshopId, role }) => ({ workshopId, role })),
    host: env().HOST_EMAILS.some((email) => email.toLowerCase() === person.emailNormal),
    // A demo sign-in counts as having given its code: there is no authenticator to ask.
    secondFactorAt: env().SANDBOX && session.device === SANDBOX_DEVICE ? new Date() : session.secondFactorAt,
  }
}
