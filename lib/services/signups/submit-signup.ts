import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { env } from '@/lib/config/env'
import { refuseFields } from '@/lib/contracts/problem'
import type { SignUpInput } from '@/lib/contracts/signups'
import { isCountry } from '@/lib/core/data/country'
import { ok, refuse } from '@/lib/core/result'
import { addDays } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { setDue } from '@/lib/jobs/set-due'
import { signUpWords } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'
import { Module, Offer, SignUp, Workshop } from '@/models'
import { findOrAddPerson } from '../_steps/find-or-add-person'
import { queueMail } from '../_steps/queue-mail'
import { recordMove } from '../_steps/record-move'

/** Days an unconfirmed sign-up is kept. */
export const CONFIRM_DAYS = 14
/** Confirming mails one address is sent in an hour, about one module and in all; more are answered alike and not sent. */
const MOST_AN_HOUR = { module: 5, all: 20 } as const

/**
 * Takes down a statement of interest and mails the link that confirms it; until then nothing counts and nothing of an
 * earlier one changes. Answers alike for every address.
 * Refuses: not_found (workshop or module not public) · invalid (offer, country, price not on the list). Locks: nothing.
 * Writes: person if new, one unconfirmed sign-up, one mail, audit, the day it is deleted. Repeat: another link.
 */
export function submitSignUp(cmd: { input: SignUpInput; now: Date }) {
  const { input, now } = cmd
  return inTransaction(async (tx) => {
    const workshop = await Workshop.findOne({
      where: { slug: input.workshop, state: 'open' },
      transaction: tx,
    })
    const module =
      workshop &&
      (await Module.findOne({
        where: { workshopId: workshop.id, slug: input.module, state: 'published' },
        include: [{ model: Offer, as: 'offers', required: false, where: { withdrawnAt: null } }],
        transaction: tx,
      }))
    if (!workshop || !module) return refuse('not_found')
    const offer = module.offers?.find((each) => each.kind === input.offer)
    if (!offer) return refuseFields({ offer: signUpWords.offerUnknown })
    if (!isCountry(input.country)) return refuseFields({ country: signUpWords.countryUnknown })
    const asked = offer.priceMinor === null ? offer.priceListMinor : []
    const top = input.topPriceMinor ?? null
    if (top !== null && !asked.some((price) => price === top))
      return refuseFields({ topPriceMinor: signUpWords.priceUnknown })

    const person = await findOrAddPerson(tx, input.email, now)
    if (await wroteTooOften(module.id, person.id, now, tx)) return ok({ next: 'confirm' as const })
    const token = makeToken()
    const signUp = await SignUp.create(
      {
        workshopId: workshop.id,
        moduleId: module.id,
        offerId: offer.id,
        personId: person.id,
        quantity: input.quantity,
        country: input.country,
        certainty: input.certainty,
        topPriceMinor: asked.find((price) => price === top) ?? null,
        askedPricesMinor: asked,
        shownPriceMinor: offer.priceMinor,
        currency: workshop.currency,
        wantsUpdates: input.updates,
        confirmTokenHash: hashToken(token),
        takeBackTokenHash: null,
        submittedAt: now,
        confirmExpiresAt: new Date(now.getTime() + CONFIRM_DAYS * 86_400_000),
        confirmedAt: null,
        takenBackAt: null,
        supersededAt: null,
      },
      { transaction: tx },
    )
    await recordMove(tx, {
      workshopId: workshop.id,
      subjectType: 'signup',
      subjectId: signUp.id,
      from: null,
      event: 'submit',
      to: 'unconfirmed',
      byPersonId: person.id,
      at: now,
    })
    await setDue(tx, {
      kind: 'signup_unconfirmed',
      subjectId: signUp.id,
      workshopId: workshop.id,
      at: signUp.confirmExpiresAt,
    })
    await queueMail(tx, {
      kind: 'confirm_signup',
      workshopId: workshop.id,
      personId: person.id,
      subjectId: signUp.id,
      props: {
        module: module.name,
        offer: offer.kind,
        quantity: signUp.quantity,
        confirmUrl: `${env().BASE_URL}${paths.confirm(token)}`,
        deleteOn: addDays(dayIn(now, workshop.timeZone), CONFIRM_DAYS),
      },
      now,
    })
    return ok({ next: 'confirm' as const })
  })
}

async function wroteTooOften(
  moduleId: string,
  personId: string,
  now: Date,
  tx: Transaction,
): Promise<boolean> {
  const lately = { [Op.gt]: new Date(now.getTime() - 3_600_000) }
  const open = await SignUp.findAll({
    where: { personId, state: 'unconfirmed', submittedAt: lately },
    attributes: ['moduleId'],
    transaction: tx,
  })
  const ofModule = open.filter((each) => each.moduleId === moduleId)
  return ofModule.length >= MOST_AN_HOUR.module || open.length >= MOST_AN_HOUR.all
}
