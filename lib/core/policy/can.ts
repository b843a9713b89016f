import type { Audience, Role } from '@/lib/core/policy/audience'
import { DEED_RULES, type Deed } from '@/lib/core/policy/deeds'

/** Someone in front of the program: nobody known, or a signed-in person with their memberships. */
export type Actor =
  | { readonly kind: 'visitor' }
  | {
      readonly kind: 'person'
      readonly personId: string
      readonly email: string
      readonly memberships: readonly { readonly workshopId: string; readonly role: Role }[]
      /** Whether this person runs the deployment. */
      readonly host: boolean
      /** When the last second factor was given in this session; null for never. */
      readonly secondFactorAt: Date | null
    }

/** What a deed is about: the workshop that owns the row, and the person whom the row is about. */
export type Target = { readonly workshopId?: string; readonly personId?: string }

/**
 * Whether an actor may do a deed to a target. A deed of a workshop needs the workshop named, a deed of a person the person:
 * what is left out is nobody's. An owner may do everything of the own workshop that is not the buyer's own to do;
 * a host has no rights inside a workshop. Whether a code must be fresh is `needsSecondFactor`.
 * Domain:  a deed of DEEDS → otherwise RangeError.
 * @example can({ kind: 'visitor' }, 'signup:submit', {})  // → true
 * @example can({ kind: 'visitor' }, 'run:read', { workshopId: 'w1' })  // → false
 */
export function can(actor: Actor, deed: Deed, target: Target = {}): boolean {
  if (!Object.hasOwn(DEED_RULES, deed)) throw new RangeError(`can: deed must be one of DEEDS, got ${deed}`)
  return DEED_RULES[deed].for.some((audience) => belongs(actor, audience, target))
}

function belongs(actor: Actor, audience: Audience, target: Target): boolean {
  if (audience === 'anybody') return true
  if (actor.kind === 'visitor') return false
  switch (audience) {
    case 'person':
      return true
    case 'self':
      return target.personId !== undefined && target.personId === actor.personId
    case 'host':
      return actor.host
    default:
      return (
        target.workshopId !== undefined &&
        actor.memberships.some((each) => each.workshopId === target.workshopId && each.role === audience)
      )
  }
}
