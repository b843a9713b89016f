import type { Actor } from '@/lib/core/policy/can'

type Person = Extract<Actor, { kind: 'person' }>

/**
 * What the people of the demo need of the world around the services: time that passes, mails that arrive, a card page, a
 * provider whose forms can be filled in. `scripts/support/demo-stage.ts` makes one.
 */
export type Stage = {
  /** Business time now. */
  now: () => Promise<Date>
  /** Lets business time pass up to an instant, doing on the way whatever falls due, when it falls due. */
  goTo: (instant: Date) => Promise<void>
  /** Everything that is waiting: jobs, mails, the provider's events. */
  settle: () => Promise<void>
  /** Somebody who signs in, known from now on; the second factor counts as given. */
  person: (email: string) => Promise<Person>
  /** The newest link to a part of ours in the mails to somebody; the last part of its path. */
  tokenFrom: (email: string, path: string) => Promise<string>
  /** Fills in the card page. */
  pay: (payUrl: string, card: string) => Promise<'captured' | 'failed'>
  /** Fills in the provider's forms of a workshop's account, and puts a float on it for fees that do not come back. */
  finishAccount: (workshop: string, floatMinor: number) => Promise<void>
}
