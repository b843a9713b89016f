import { expect, test } from 'vitest'
import { ok } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { endInvitations } from '@/lib/services/_steps/end-invitations'
import { inviteSignUp } from '@/lib/services/_steps/invite-signup'
import { takeBackSignUp } from '@/lib/services/signups/take-back-signup'
import { AuditEntry, Invitation, MailOutbox, type Run, type SignUp } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { signUp } from './sign-up-world'

const invite = async (run: Run, signup: SignUp) => {
  const done = await inTransaction(async (tx) =>
    ok(await inviteSignUp(tx, { run, signUp: signup, now: NOW })),
  )
  return done.value
}
const statesOf = async (run: Run) => {
  const rows = await Invitation.findAll({ where: { runId: run.id }, order: [['state', 'ASC']] })
  return rows.map(({ state }) => state)
}

test('a sign-up is invited to a run once, with one mail', async () => {
  const { run, offers } = await makeRun()
  const { signup } = await makeSignUp(offers.kit)
  expect(await invite(run, signup)).toBe(true)
  expect(await invite(run, signup)).toBe(false)
  const invitation = await Invitation.findOne({ where: { runId: run.id }, rejectOnEmpty: true })
  const mails = await MailOutbox.findAll({ where: { kind: 'deposits_open', subjectId: invitation.id } })
  expect(mails).toHaveLength(1)
  expect(mails[0]?.props).toMatchObject({ minimum: 3, maximum: 5, decideBy: '2027-04-01' })
})

test('during the head start the mail names its end, afterwards none', async () => {
  const { run, offers } = await makeRun(undefined, { opensToAllAt: hoursAfter(NOW, 48) })
  const { signup } = await makeSignUp(offers.kit)
  await invite(run, signup)
  const mail = await MailOutbox.findOne({ where: { kind: 'deposits_open' }, order: [['queuedAt', 'DESC']] })
  const { opensToAllAt } = (await Invitation.findOne({ where: { runId: run.id }, include: 'run' }))!.run!
  const mine = await MailOutbox.findAll({ where: { kind: 'deposits_open', personId: signup.personId } })
  expect(mine[0]?.props).toMatchObject({ opensToAllAt: opensToAllAt!.toISOString() })
  expect(mail).not.toBeNull()
})

test('who confirms while a run takes deposits is invited at once; not once decide-by has passed', async () => {
  const open = await makeRun()
  await signUp(open, { email: 'late@example.org' })
  expect(await statesOf(open.run)).toEqual(['sent'])

  const over = await makeRun()
  await signUp(over, { email: 'later@example.org' }, new Date('2027-04-02T09:00:00Z'))
  expect(await statesOf(over.run)).toEqual([])
})

test('taking the sign-up back declines its invitation; the end of deposits ends the open ones', async () => {
  const { run, offers } = await makeRun()
  const first = await makeSignUp(offers.kit)
  const second = await makeSignUp(offers.kit)
  await invite(run, first.signup)
  await invite(run, second.signup)
  await takeBackSignUp({ token: first.tokens.takeBack, now: NOW })
  expect(await statesOf(run)).toEqual(['declined', 'sent'])
  await inTransaction(async (tx) => ok(await endInvitations(tx, run, NOW)))
  expect(await statesOf(run)).toEqual(['declined', 'expired'])
  const moves = await AuditEntry.findAll({ where: { subjectType: 'invitation', workshopId: run.workshopId } })
  expect(moves.map(({ event }) => event).sort()).toEqual(['decline', 'end', 'send', 'send'])
})
