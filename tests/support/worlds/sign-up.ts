import { createHash, randomUUID } from 'node:crypto'
import type { CreationAttributes } from 'sequelize'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { takeBackToken } from '@/lib/services/_steps/take-back-token'
import { type Offer, type Person, SignUp } from '@/models'
import { hoursAfter, NOW } from './base'
import { makePerson } from './person'

export const hashOf = (token: string) => createHash('sha256').update(token).digest('hex')

/** A confirmed sign-up for one of the offer; `tokens` are what its two links carried. */
export async function makeSignUp(
  offer: Offer,
  over: Partial<CreationAttributes<SignUp>> & { person?: Person } = {},
) {
  const { person = await makePerson(), ...columns } = over
  const id = columns.id ?? randomUUID()
  const tokens = { confirm: makeToken(), takeBack: takeBackToken(id) }
  const isConfirmed = (columns.state ?? 'confirmed') !== 'unconfirmed'
  const signup = await SignUp.create({
    id,
    workshopId: offer.workshopId,
    moduleId: offer.moduleId,
    offerId: offer.id,
    personId: person.id,
    quantity: 1,
    country: 'DE',
    certainty: 'certain',
    shownPriceMinor: offer.priceMinor,
    currency: 'EUR',
    state: 'confirmed',
    confirmTokenHash: isConfirmed ? null : hashToken(tokens.confirm),
    takeBackTokenHash: isConfirmed ? hashToken(tokens.takeBack) : null,
    submittedAt: hoursAfter(NOW, -72),
    confirmExpiresAt: hoursAfter(NOW, -72 + 14 * 24),
    confirmedAt: isConfirmed ? hoursAfter(NOW, -71) : null,
    ...columns,
  })
  return { signup, person, tokens }
}
