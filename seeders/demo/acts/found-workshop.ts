import { DetailsInput, MemberInput, PostageInput, TermsInput } from '@/lib/contracts/settings'
import { WorkshopInput } from '@/lib/contracts/workshops'
import { acceptMembership } from '@/lib/services/members/accept-membership'
import { inviteMember } from '@/lib/services/members/invite-member'
import { publishTerms } from '@/lib/services/settings/publish-terms'
import { savePostage } from '@/lib/services/settings/save-postage'
import { saveWorkshopDetails } from '@/lib/services/settings/save-workshop-details'
import { connectPaymentAccount } from '@/lib/services/workshops/connect-payment-account'
import { moveWorkshop } from '@/lib/services/workshops/move-workshop'
import { startWorkshop } from '@/lib/services/workshops/start-workshop'
import { Workshop } from '@/models'
import type { Stage } from '../stage'
import { done } from './done'

/** A workshop as its owner types it in, form by form. */
export type WorkshopPlan = {
  owner: string
  host: string
  start: Record<string, unknown>
  details: Record<string, unknown>
  postage: readonly Record<string, unknown>[]
  terms: Record<string, unknown>
  members: readonly { email: string; role: 'bench' | 'packer' }[]
}

/** What an owner leaves on the account, so that everyone can be paid back although the provider keeps its fees. */
const FLOAT_MINOR = 30_000

export type Founded = { workshopId: string; slug: string; owner: string }

/** From nothing to an open workshop that can take payments: start, account, host, settings, people. */
export async function foundWorkshop(stage: Stage, plan: WorkshopPlan): Promise<Founded> {
  const now = await stage.now()
  const { workshop: slug } = done(
    await startWorkshop({
      actor: await stage.person(plan.owner),
      input: WorkshopInput.parse(plan.start),
      now,
    }),
    'starting a workshop',
  )
  const { id: workshopId } = await Workshop.findOne({ where: { slug }, rejectOnEmpty: true })
  const actor = await stage.person(plan.owner)
  done(await connectPaymentAccount({ actor, workshopId, now }), 'connecting the account')
  await stage.finishAccount(slug, FLOAT_MINOR)
  done(await moveWorkshop({ actor: await stage.person(plan.host), slug, event: 'open', now }), 'opening')

  const details = DetailsInput.parse(plan.details)
  done(await saveWorkshopDetails({ actor, workshopId, input: details, now }), 'the details')
  for (const zone of plan.postage)
    done(await savePostage({ actor, workshopId, input: PostageInput.parse(zone), now }), 'a zone of the post')
  done(await publishTerms({ actor, workshopId, input: TermsInput.parse(plan.terms), now }), 'the terms')
  for (const member of plan.members) {
    const input = MemberInput.parse(member)
    done(await inviteMember({ actor, workshopId, input, now }), `inviting ${member.email}`)
    await stage.settle()
    const token = await stage.tokenFrom(member.email, '/join')
    done(await acceptMembership({ actor: await stage.person(member.email), token, now }), 'joining')
  }
  return { workshopId, slug, owner: plan.owner }
}
