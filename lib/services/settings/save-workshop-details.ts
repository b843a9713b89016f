import 'server-only'
import { refuseFields } from '@/lib/contracts/problem'
import type { DetailsInput } from '@/lib/contracts/settings'
import { isCountry } from '@/lib/core/data/country'
import { can, type Actor } from '@/lib/core/policy/can'
import { addressProblems } from '@/lib/core/post/address-problems'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { addressMistakes } from '@/lib/messages/address-mistakes'
import { Workshop } from '@/models'
import { workshopPagesChanged } from '../_steps/workshop-pages-changed'

/**
 * Saves who the workshop is, where it can be written to, how it charges tax and what new runs start from. Orders placed
 * before keep what they were quoted.
 * Refuses: not_found · forbidden · invalid (the postal address lacks something). Locks: the workshop. Writes: the
 * workshop; its public pages are made anew. Repeat: safe.
 */
export function saveWorkshopDetails(cmd: {
  actor: Actor
  workshopId: string
  input: DetailsInput
  now: Date
}) {
  const { actor, workshopId, input } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'settings:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!workshop) return refuse('not_found')
    const mistakes = mistakesOf(input.postalAddress)
    if (Object.keys(mistakes).length > 0) return refuseFields(mistakes)
    await workshop.update(
      {
        ...input,
        phone: input.phone ?? null,
        taxNumber: input.taxNumber ?? null,
        taxNote: input.taxNote ?? null,
      },
      { transaction: tx },
    )
    await workshopPagesChanged(tx, workshop)
    return ok({ workshop: workshop.slug })
  })
}

function mistakesOf(address: DetailsInput['postalAddress']): Record<string, string> {
  if (!isCountry(address.country)) return { 'postalAddress.country': addressMistakes.country }
  const errors = addressProblems(address).filter(({ severity }) => severity === 'error')
  return Object.fromEntries(
    errors.map(({ field }) => [
      `postalAddress.${field === 'lines' ? 'lines.0' : field}`,
      addressMistakes.missing,
    ]),
  )
}
