import type { LinkedSignUp } from '@/lib/contracts/signups'
import { signUpWords as words } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'

/** What to say of a sign-up that its link can no longer change; null while it can. */
export function signUpEnded(signUp: LinkedSignUp | null) {
  if (!signUp) return { title: words.unknownTitle, lead: words.unknown }
  const way = {
    href: `${paths.module(signUp.workshop.slug, signUp.module.slug)}#interest`,
    label: words.signUpAgain,
  }
  if (signUp.isExpired) return { title: words.expiredTitle, lead: words.expired, way }
  if (signUp.state === 'taken_back') return { title: words.takenBackTitle, lead: words.takenBack, way }
  if (signUp.state === 'superseded') return { title: words.supersededTitle, lead: words.superseded, way }
  return null
}
