import { randomUUID } from 'node:crypto'
import { expect, test } from 'vitest'
import { isStillTrue } from '@/lib/queries/mails/is-still-true'
import { type MailKind } from '@/lib/contracts/mails'
import { sequelize } from '@/lib/db/sequelize'
import { Invitation, Notice, NoticeAnswer, Order, StaffInvitation } from '@/models'
import { at, hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeAttempt } from '@/tests/support/worlds/payment'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

const holds = (kind: MailKind, subjectId: string, now = NOW) =>
  sequelize.transaction((tx) => isStillTrue({ kind, subjectId, now }, tx))

test('a sign-up is asked to confirm while it is unconfirmed and the link works', async () => {
  const { offers } = await makeModule((await makeWorkshop()).workshop)
  const { signup } = await makeSignUp(offers.kit, { state: 'unconfirmed' })
  expect(await holds('confirm_signup', signup.id)).toBe(true)
  expect(await holds('signup_confirmed', signup.id)).toBe(false)
  expect(await holds('confirm_signup', signup.id, at('2028-01-01T00:00:00Z'))).toBe(false)
  await signup.update({ state: 'confirmed', confirmedAt: NOW, confirmTokenHash: null })
  expect(await holds('confirm_signup', signup.id)).toBe(false)
  expect(await holds('signup_confirmed', signup.id)).toBe(true)
})

test('an invitation stands while its run takes deposits and its sign-up is not taken back', async () => {
  const { workshop, run, offers } = await makeRun()
  const { signup, person } = await makeSignUp(offers.kit)
  const invitation = await Invitation.create({
    workshopId: workshop.id,
    runId: run.id,
    signupId: signup.id,
    personId: person.id,
    sentAt: NOW,
  })
  expect(await holds('deposits_open', invitation.id)).toBe(true)
  await signup.update({ state: 'taken_back', takenBackAt: NOW })
  expect(await holds('deposits_open', invitation.id)).toBe(false)
  await signup.update({ state: 'confirmed', takenBackAt: null })
  await run.update({
    state: 'called_off',
    calledOffAt: NOW,
    callOffCause: 'owner',
    callOffReason: 'No boards.',
  })
  expect(await holds('deposits_open', invitation.id)).toBe(false)
})

test.each<[MailKind, 'awaiting_deposit' | 'balance_due' | 'expired']>([
  ['place_free', 'awaiting_deposit'],
  ['balance_coming', 'balance_due'],
  ['balance_reminder', 'balance_due'],
  ['place_released', 'expired'],
])('%s is true of an order in %s only', async (kind, state) => {
  const { run, runOffers } = await makeRun()
  const { order } = await makeOrder({ run, lines: [{ offer: runOffers.kit, quantity: 1 }] }, { state })
  expect(await holds(kind, order.id)).toBe(true)
  await Order.update(
    { state: 'paid', paidAt: NOW, holdUntil: null, expiredAt: null },
    { where: { id: order.id } },
  )
  expect(await holds(kind, order.id)).toBe(false)
})

test('"your card needs you" is asked by its attempt', async () => {
  const { run, runOffers } = await makeRun()
  const { order } = await makeOrder(
    { run, lines: [{ offer: runOffers.kit, quantity: 1 }] },
    { state: 'balance_due' },
  )
  const attempt = await makeAttempt(order, { purpose: 'balance', state: 'needs_customer' })
  expect(await holds('card_needs_you', attempt.id)).toBe(true)
  await Order.update({ state: 'paid', paidAt: NOW }, { where: { id: order.id } })
  expect(await holds('card_needs_you', attempt.id)).toBe(false)
})

test('a notice is sent while it is unanswered', async () => {
  const { workshop, run, runOffers } = await makeRun()
  const { order } = await makeOrder({ run, lines: [{ offer: runOffers.kit, quantity: 1 }] })
  const notice = await Notice.create({
    workshopId: workshop.id,
    runId: run.id,
    runOfferId: runOffers.kit.id,
    kind: 'delay',
    number: 1,
    reason: 'The jacks are late.',
    promisedByOn: '2027-08-31',
    revisedByOn: '2027-10-31',
    sentAt: NOW,
  })
  const answer = await NoticeAnswer.create({
    workshopId: workshop.id,
    noticeId: notice.id,
    orderId: order.id,
    silenceMeans: 'wait',
    answerByOn: '2027-04-01',
    answerByAt: at('2027-04-01T22:00:00Z'),
  })
  expect(await holds('delay_notice', answer.id)).toBe(true)
  await answer.update({ answer: 'wait', answeredAt: NOW })
  expect(await holds('delay_notice', answer.id)).toBe(false)
})

test('an invitation to work is sent while it can be accepted', async () => {
  const { workshop, owner } = await makeWorkshop()
  const asked = await StaffInvitation.create({
    workshopId: workshop.id,
    emailNormal: 'lene@example.org',
    role: 'packer',
    tokenHash: randomUUID(),
    createdAt: NOW,
    createdByPersonId: owner.id,
    expiresAt: hoursAfter(NOW, 24),
  })
  expect(await holds('staff_invitation', asked.id)).toBe(true)
  expect(await holds('staff_invitation', asked.id, hoursAfter(NOW, 25))).toBe(false)
  await asked.update({ withdrawnAt: NOW })
  expect(await holds('staff_invitation', asked.id)).toBe(false)
})

test('what reports a fact always holds; what asks about a row that is gone does not', async () => {
  expect(await holds('refund_sent', randomUUID())).toBe(true)
  for (const kind of [
    'confirm_signup',
    'deposits_open',
    'balance_coming',
    'card_needs_you',
    'delay_notice',
  ] as const) {
    expect(await holds(kind, randomUUID())).toBe(false)
  }
})
