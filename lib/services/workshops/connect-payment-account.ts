import 'server-only'
import { env } from '@/lib/config/env'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { payments } from '@/lib/gateways/payments'
import { paths } from '@/lib/paths'
import { Workshop } from '@/models'

/**
 * Makes the workshop's account at the payment provider, once, and gives the link to the provider's own forms.
 * The key is the workshop's own, so that a lost answer and a second press lead to the same account.
 * Refuses: not_found · forbidden · provider_unreachable. Locks: the workshop while its account is written down.
 * Writes: the account's id. Repeat: safe; gives a fresh link.
 */
export async function connectPaymentAccount(cmd: { actor: Actor; workshopId: string; now: Date }) {
  const { actor, workshopId } = cmd
  if (actor.kind !== 'person' || !can(actor, 'payment_account:connect', { workshopId }))
    return refuse('forbidden')
  const workshop = await Workshop.findByPk(workshopId)
  if (!workshop) return refuse('not_found')
  const account = workshop.providerAccountId ?? (await makeAccount(workshop, actor.email))
  if (account === null) return refuse('provider_unreachable')
  const back = `${env().BASE_URL}${paths.adminPaymentAccount(workshop.slug)}`
  const link = await payments().onboardingLink({ account, returnUrl: back, refreshUrl: back })
  return link.ok ? ok({ url: link.value.url }) : refuse('provider_unreachable')
}

async function makeAccount(workshop: Workshop, email: string): Promise<string | null> {
  const made = await payments().createAccount({
    key: `account:${workshop.id}`,
    workshopId: workshop.id,
    country: workshop.country,
    currency: workshop.currency,
    email: workshop.replyTo ?? email,
    name: workshop.legalName ?? workshop.name,
  })
  if (!made.ok) return null
  await inTransaction(async (tx) => {
    const row = await Workshop.findByPk(workshop.id, {
      transaction: tx,
      lock: tx.LOCK.UPDATE,
      rejectOnEmpty: true,
    })
    if (row.providerAccountId === null)
      await row.update({ providerAccountId: made.value.account }, { transaction: tx })
    return ok({})
  })
  return made.value.account
}
