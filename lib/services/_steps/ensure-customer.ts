import 'server-only'
import { ok, refuse, type Result } from '@/lib/core/result'
import { payments } from '@/lib/gateways/payments'
import { type Person, ProviderCustomer, type Workshop } from '@/models'

/**
 * The buyer as the provider knows them on the workshop's account, made when new. Before the transaction of a payment:
 * without a customer no call for money is made, so that a lost answer can always be looked up.
 * Refuses: cannot_charge (no account) · provider_unreachable. Locks: nothing. Writes: at most one row. Repeat: safe.
 */
export async function ensureCustomer(
  workshop: Workshop,
  person: Person,
  now: Date,
): Promise<Result<string, 'cannot_charge' | 'provider_unreachable'>> {
  const account = workshop.providerAccountId
  if (account === null || workshop.chargesEnabledAt === null) return refuse('cannot_charge')
  const where = { workshopId: workshop.id, personId: person.id }
  const known = await ProviderCustomer.findOne({ where })
  if (known?.providerAccountId === account) return ok(known.providerId)
  const made = await payments().ensureCustomer({
    account,
    key: `customer:${account}:${person.id}`,
    personId: person.id,
    email: person.emailShown ?? person.emailNormal ?? '',
  })
  if (!made.ok) return refuse('provider_unreachable')
  const row = { providerAccountId: account, providerId: made.value.customer }
  // A workshop that was connected anew starts without the cards of its old account.
  const noCard = { methodId: null, methodBrand: null, methodLast4: null, methodSavedAt: null }
  if (known) await known.update({ ...row, ...noCard })
  else await ProviderCustomer.findOrCreate({ where, defaults: { ...where, ...row, createdAt: now } })
  return ok(made.value.customer)
}
