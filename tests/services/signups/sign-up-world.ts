import type { SignUpInput } from '@/lib/contracts/signups'
import { confirmSignUp } from '@/lib/services/signups/confirm-signup'
import { submitSignUp } from '@/lib/services/signups/submit-signup'
import { SignUp } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { tokenOf } from './mailed-token'

export type Named = { workshop: { slug: string }; module: { slug: string } }

/** What the form of a module sends when everything is right; each module's from an address of its own. */
export const wanted = ({ workshop, module }: Named, over: Partial<SignUpInput> = {}): SignUpInput => ({
  workshop: workshop.slug,
  module: module.slug,
  offer: 'kit',
  quantity: 2,
  country: 'DE',
  certainty: 'likely',
  email: `${module.slug}@example.org`,
  updates: true,
  ...over,
})

export const submit = (world: Named, over: Partial<SignUpInput> = {}, now = NOW) =>
  submitSignUp({ input: wanted(world, over), now })

/** Submits and confirms by the mailed link; gives both links' tokens. */
export async function signUp(world: Named, over: Partial<SignUpInput> = {}, now = NOW) {
  const email = wanted(world, over).email
  await submit(world, over, now)
  const confirm = await tokenOf('confirm_signup', email)
  const confirmed = await confirmSignUp({ token: confirm, now })
  const takeBack = await tokenOf('signup_confirmed', email)
  return { confirm, takeBack, confirmed }
}

export const statesOf = async (moduleId: string) =>
  (await SignUp.findAll({ where: { moduleId }, order: [['submittedAt', 'ASC']] })).map(({ state }) => state)
