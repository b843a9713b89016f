import 'server-only'
import { Op, type Transaction } from 'sequelize'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { env } from '@/lib/config/env'
import { refuseFields } from '@/lib/contracts/problem'
import type { MemberInput } from '@/lib/contracts/settings'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'
import { Membership, Person, StaffInvitation, Workshop } from '@/models'
import { findOrAddPerson } from '../_steps/find-or-add-person'
import { queueMail } from '../_steps/queue-mail'

const VALID_MS = 14 * 86_400_000
/** Invitations one address is sent by one workshop in an hour. */
const MOST_AN_HOUR = 5

/**
 * Asks someone by mail to work for the workshop in one role. An invitation still open to the same address is withdrawn, so
 * that one link works at a time.
 * Refuses: not_found · forbidden · already_member (in that very role) · invalid (written to too often). Locks: the
 * workshop. Writes: person if new, invitation, mail. Repeat: another link, the earlier one stops working.
 */
export function inviteMember(cmd: { actor: Actor; workshopId: string; input: MemberInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'member:invite', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!workshop) return refuse('not_found')
    const person = await findOrAddPerson(tx, input.email, now)
    const where = { workshopId, personId: person.id, role: input.role, endedAt: null }
    if ((await Membership.count({ where, transaction: tx })) > 0) return refuse('already_member')
    const emailNormal = person.emailNormal!
    if (await wroteTooOften(tx, workshopId, emailNormal, now))
      return refuseFields({ email: words.invitedTooOften })

    await StaffInvitation.update(
      { withdrawnAt: now },
      { where: { workshopId, emailNormal, acceptedAt: null, withdrawnAt: null }, transaction: tx },
    )
    const token = makeToken()
    const invitation = await StaffInvitation.create(
      {
        workshopId,
        emailNormal,
        role: input.role,
        tokenHash: hashToken(token),
        createdAt: now,
        createdByPersonId: actor.personId,
        expiresAt: new Date(now.getTime() + VALID_MS),
        acceptedAt: null,
        acceptedByPersonId: null,
        withdrawnAt: null,
      },
      { transaction: tx },
    )
    const inviter = await Person.findByPk(actor.personId, { transaction: tx, rejectOnEmpty: true })
    await queueMail(tx, {
      kind: 'staff_invitation',
      workshopId,
      personId: person.id,
      subjectId: invitation.id,
      props: {
        role: input.role,
        invitedBy: inviter.name ?? actor.email,
        acceptUrl: `${env().BASE_URL}${paths.join(token)}`,
        validUntil: dayIn(invitation.expiresAt, workshop.timeZone),
      },
      now,
    })
    return ok({ invitation: invitation.id })
  })
}

async function wroteTooOften(
  tx: Transaction,
  workshopId: string,
  emailNormal: string,
  now: Date,
): Promise<boolean> {
  const createdAt = { [Op.gt]: new Date(now.getTime() - 3_600_000) }
  const count = await StaffInvitation.count({
    where: { workshopId, emailNormal, createdAt },
    transaction: tx,
  })
  return count >= MOST_AN_HOUR
}
