import { describe, expect, test } from 'vitest'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { endInvitations, inviteSignUps, signUpsToInvite } from '@/lib/services/_steps/invite-signups'
import { confirmSignUp } from '@/lib/services/signups/confirm-signup'
import { submitSignUp } from '@/lib/services/signups/submit-signup'
import { takeBackSignUp } from '@/lib/services/signups/take-back-signup'
import { AuditEntry, Invitation, MailOutbox, type Run } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { tokenOf } from './mailed-token'

const toInvite = (run: Run) =>
  inTransaction(async (tx) => ok(await signUpsToInvite(tx, run))).then((found) => found.value)
const invite = (run: Run, signUpIds: string[]) =>
  inTransaction(async (tx) => ok(await inviteSignUps(tx, { runId: run.id, signUpIds, now: NOW }))).then(
    (found) => found.value,
  )

async function invitedWorld() {
  const { workshop, module, offers, run } = await makeRun()
  const { signup } = await makeSignUp(offers.kit)
  await makeSignUp(offers.kit, { state: 'unconfirmed' })
  return { workshop, module, offers, run, signup }
}

describe('a run that opens', () => {
  test('invites confirmed sign-ups, first come first, each once, with one mail', async () => {
    const { run, offers, signup } = await invitedWorld()
    const early = await makeSignUp(offers.built, { confirmedAt: hoursAfter(NOW, -90) })
    const ids = await toInvite(run)
    expect(ids).toEqual([early.signup.id, signup.id])
    expect(await invite(run, ids)).toBe(2)
    expect(await invite(run, ids)).toBe(0)
    expect(await toInvite(run)).toEqual([])
    const invitations = await Invitation.findAll({ where: { runId: run.id } })
    const mails = await MailOutbox.findAll({ where: { kind: 'deposits_open' } })
    expect(mails.map(({ subjectId }) => subjectId).sort()).toEqual(invitations.map(({ id }) => id).sort())
  })

  test('leaves out who took it back meanwhile, and everybody once it takes no deposits', async () => {
    const { run, offers, signup } = await invitedWorld()
    const gone = await makeSignUp(offers.kit)
    const ids = [signup.id, gone.signup.id]
    await takeBackSignUp({ token: gone.tokens.takeBack, now: NOW })
    expect(await invite(run, ids)).toBe(1)
    const later = await makeSignUp(offers.kit)
    await run.update({
      state: 'called_off',
      calledOffAt: NOW,
      callOffCause: 'owner',
      callOffReason: 'Tried.',
    })
    expect(await invite(run, [later.signup.id])).toBe(0)
  })

  test('never invites the sign-ups of another module', async () => {
    const { run } = await invitedWorld()
    const other = await invitedWorld()
    expect(await invite(run, [other.signup.id])).toBe(0)
  })
})

test('who confirms while the run takes deposits is invited at once', async () => {
  const { workshop, module, run } = await invitedWorld()
  await submitSignUp({
    input: {
      workshop: workshop.slug,
      module: module.slug,
      offer: 'built',
      quantity: 1,
      country: 'DE',
      certainty: 'certain',
      email: 'late@example.org',
      updates: false,
    },
    now: NOW,
  })
  await confirmSignUp({ token: await tokenOf('confirm_signup', 'late@example.org'), now: NOW })
  expect(await Invitation.count({ where: { runId: run.id, state: 'sent' } })).toBe(1)
})

test('taking the sign-up back declines the invitation; the end of deposits ends the open ones', async () => {
  const { run, offers } = await invitedWorld()
  const first = await makeSignUp(offers.kit)
  const second = await makeSignUp(offers.kit)
  await invite(run, [first.signup.id, second.signup.id])
  await takeBackSignUp({ token: first.tokens.takeBack, now: NOW })
  const ended = await inTransaction(async (tx) => ok(await endInvitations(tx, { runId: run.id, now: NOW })))
  expect(ended.value).toBe(1)
  const states = await Invitation.findAll({ where: { runId: run.id }, order: [['state', 'ASC']] })
  expect(states.map(({ state }) => state)).toEqual(['declined', 'expired'])
  const moves = await AuditEntry.count({
    where: { subjectType: 'invitation', toState: ['declined', 'expired'] },
  })
  expect(moves).toBe(2)
})
