import { describe, expect, test } from 'vitest'
import { makeToken } from '@/lib/config/secrets'
import { ok, refuse } from '@/lib/core/result'
import { confirmSignUp } from '@/lib/services/signups/confirm-signup'
import { takeBackSignUp } from '@/lib/services/signups/take-back-signup'
import { AuditEntry, DueItem, MailOutbox, SignUp } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { tokenOf } from './mailed-token'
import { signUp, statesOf, submit } from './sign-up-world'

async function house() {
  const made = await makeWorkshop()
  return { ...made, ...(await makeModule(made.workshop)) }
}
const mailOf = ({ module }: { module: { slug: string } }) => `${module.slug}@example.org`
const confirmed = ok({ state: 'confirmed' })

describe('the confirming link', () => {
  test('makes the sign-up count, mails the link that takes it back, and keeps it from being deleted', async () => {
    const world = await house()
    const { confirmed: answer, takeBack } = await signUp(world)
    expect(answer).toEqual(confirmed)
    const row = await SignUp.findOne({ where: { moduleId: world.module.id }, rejectOnEmpty: true })
    expect(row).toMatchObject({ state: 'confirmed', confirmedAt: NOW })
    expect(takeBack).toMatch(/^[\w-]{43}$/)
    expect(await DueItem.count({ where: { kind: 'signup_unconfirmed', subjectId: row.id } })).toBe(0)
    const moves = await AuditEntry.findAll({ where: { subjectId: row.id }, order: [['seq', 'ASC']] })
    expect(moves.map(({ event, toState }) => `${event} ${toState}`)).toEqual([
      'submit unconfirmed',
      'confirm confirmed',
    ])
  })

  test('may be followed twice, by a mail scanner or a double click; it counts once', async () => {
    const world = await house()
    const { confirm } = await signUp(world)
    expect(await confirmSignUp({ token: confirm, now: NOW })).toEqual(confirmed)
    const row = await SignUp.findOne({ where: { moduleId: world.module.id }, rejectOnEmpty: true })
    expect(await MailOutbox.count({ where: { kind: 'signup_confirmed', subjectId: row.id } })).toBe(1)
    expect(await AuditEntry.count({ where: { subjectId: row.id, event: 'confirm' } })).toBe(1)
  })

  test('works until 14 days are over', async () => {
    const world = await house()
    await submit(world)
    const token = await tokenOf('confirm_signup', mailOf(world))
    expect(await confirmSignUp({ token, now: hoursAfter(NOW, 14 * 24) })).toEqual(refuse('token_expired'))
    expect(await statesOf(world.module.id)).toEqual(['unconfirmed'])
    expect(await confirmSignUp({ token, now: hoursAfter(NOW, 14 * 24 - 1) })).toEqual(confirmed)
  })

  test('nobody made does nothing', async () => {
    expect(await confirmSignUp({ token: makeToken(), now: NOW })).toEqual(refuse('token_unknown'))
  })

  test('replaces the earlier one of the same person and module, and of no other', async () => {
    const world = await house()
    const other = await house()
    const first = await signUp(world)
    await signUp(other, { email: mailOf(world) }, hoursAfter(NOW, 0.5))
    await signUp(world, { quantity: 7, certainty: 'certain' }, hoursAfter(NOW, 1))
    expect(await statesOf(world.module.id)).toEqual(['superseded', 'confirmed'])
    expect(await statesOf(other.module.id)).toEqual(['confirmed'])
    expect(await confirmSignUp({ token: first.confirm, now: NOW })).toEqual(refuse('token_used'))
    expect(await takeBackSignUp({ token: first.takeBack, now: NOW })).toEqual(refuse('token_used'))
  })

  test('two links of one person at once: one of the two counts in the end', async () => {
    const world = await house()
    await submit(world, {}, NOW)
    const one = await tokenOf('confirm_signup', mailOf(world))
    await submit(world, { quantity: 5 }, hoursAfter(NOW, 0.1))
    const two = await tokenOf('confirm_signup', mailOf(world))
    const answers = await Promise.all([one, two].map((token) => confirmSignUp({ token, now: NOW })))
    expect(answers).toEqual([confirmed, confirmed])
    expect((await statesOf(world.module.id)).sort()).toEqual(['confirmed', 'superseded'])
  })
})

describe('the link that takes back', () => {
  test('takes it back, once and for all', async () => {
    const world = await house()
    const { takeBack, confirm } = await signUp(world)
    const gone = ok({ state: 'taken_back' })
    expect(await takeBackSignUp({ token: takeBack, now: NOW })).toEqual(gone)
    expect(await takeBackSignUp({ token: takeBack, now: NOW })).toEqual(gone)
    const row = await SignUp.findOne({ where: { moduleId: world.module.id }, rejectOnEmpty: true })
    expect(row).toMatchObject({ state: 'taken_back', takenBackAt: NOW })
    expect(await AuditEntry.count({ where: { subjectId: row.id, event: 'take_back' } })).toBe(1)
    expect(await confirmSignUp({ token: confirm, now: NOW })).toEqual(refuse('token_used'))
  })

  test('one may sign up again afterwards', async () => {
    const world = await house()
    const { takeBack } = await signUp(world)
    await takeBackSignUp({ token: takeBack, now: NOW })
    await signUp(world, {}, hoursAfter(NOW, 1))
    expect(await statesOf(world.module.id)).toEqual(['taken_back', 'confirmed'])
  })

  test('nobody made does nothing', async () => {
    expect(await takeBackSignUp({ token: makeToken(), now: NOW })).toEqual(refuse('token_unknown'))
  })
})
