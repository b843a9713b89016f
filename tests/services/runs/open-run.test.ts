import { afterAll, beforeEach, describe, expect, test } from 'vitest'
import { payments } from '@/lib/gateways/payments'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { openRun } from '@/lib/services/runs/open-run'
import { BulkItem, BulkJob, Decision, DueItem, Invitation, MailOutbox, TermsVersion } from '@/models'
import { runJobs } from '@/tests/support/run-jobs'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { moneyWorld } from '@/tests/support/worlds/money'
import { actorOf, makeUser } from '@/tests/support/worlds/person'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'

const draft = { state: 'draft' as const, openedAt: null, opensToAllAt: null, termsVersionId: null }

let world: Awaited<ReturnType<typeof moneyWorld>>
beforeEach(async () => {
  world = await moneyWorld(draft)
})
afterAll(closeSandboxPool)

const open = async (over: Partial<Parameters<typeof openRun>[0]> = {}) =>
  openRun({
    actor: await actorOf(world.owner),
    workshopId: world.workshop.id,
    runId: world.run.id,
    now: NOW,
    ...over,
  })

describe('a run that opens', () => {
  test('takes deposits under today’s terms, after the head start from everyone', async () => {
    await TermsVersion.create({
      workshopId: world.workshop.id,
      number: 2,
      body: 'The second terms.',
      publishedAt: NOW,
      publishedByPersonId: world.owner.id,
    })
    expect(await open()).toMatchObject({ ok: true })
    await world.run.reload({ include: ['termsVersion'] })
    expect(world.run).toMatchObject({
      state: 'taking_deposits',
      openedAt: NOW,
      opensToAllAt: hoursAfter(NOW, 48),
    })
    expect(world.run.termsVersion?.number).toBe(2)
    const due = await DueItem.findAll({ where: { subjectId: world.run.id }, order: [['kind', 'ASC']] })
    // Decide-by is 1 April; seven days later begins at midnight of 8 April in Berlin, 22:00 before in Greenwich.
    expect(due.map(({ kind, dueAt }) => [kind, dueAt.toISOString()])).toEqual([
      ['decide_by_passed', '2027-04-07T22:00:00.000Z'],
      // A quarter of 757 hours: 31 days, and 13 hours to the end of the last one in Hamburg.
      ['run_forecast', '2027-03-09T06:15:00.000Z'],
      ['run_page', '2027-03-01T23:00:00.000Z'],
      // Two weeks before the day, at nine in the morning.
      ['run_reminder', '2027-03-18T08:00:00.000Z'],
    ])
    const decision = await Decision.findOne({ where: { runId: world.run.id }, rejectOnEmpty: true })
    expect(decision).toMatchObject({ kind: 'open_deposits', byPersonId: world.owner.id })
  })

  test('has the account’s payouts manual at the provider before anybody can pay', async () => {
    const { account } = world
    const automatic = await payments().setAutomaticPayouts({ account, key: `auto-${account}` })
    expect(automatic.ok).toBe(true)
    await open()
    const facts = await payments().getAccount({ account })
    expect(facts).toMatchObject({ ok: true, value: { payoutSchedule: 'manual' } })
  })

  test('invites every confirmed sign-up once, and nobody else', async () => {
    const one = await makeSignUp(world.offers.kit)
    const two = await makeSignUp(world.offers.built)
    await makeSignUp(world.offers.kit, { state: 'unconfirmed' })
    await makeSignUp(world.offers.kit, { state: 'taken_back', takenBackAt: NOW })
    const opened = await open()
    if (!opened.ok) throw new Error(opened.reason)
    expect(await Invitation.count({ where: { runId: world.run.id } })).toBe(0)
    await runJobs()
    const invited = await Invitation.findAll({ where: { runId: world.run.id } })
    expect(invited.map(({ personId }) => personId).sort()).toEqual([one.person.id, two.person.id].sort())
    const subjectId = invited.map(({ id }) => id)
    const mails = await MailOutbox.findAll({ where: { kind: 'deposits_open', subjectId } })
    expect(mails.map(({ personId }) => personId).sort()).toEqual([one.person.id, two.person.id].sort())
    const job = await BulkJob.findByPk(opened.value.bulk, { rejectOnEmpty: true })
    expect(job).toMatchObject({ kind: 'invite', runId: world.run.id, byPersonId: world.owner.id })
    expect(job.doneAt).not.toBeNull()
    const items = await BulkItem.findAll({ where: { bulkJobId: job.id } })
    expect(items.map(({ state }) => state)).toEqual(['done', 'done'])
  })

  test('with nobody to invite is done at once', async () => {
    const opened = await open()
    if (!opened.ok) throw new Error(opened.reason)
    expect(await BulkJob.findByPk(opened.value.bulk)).toMatchObject({ doneAt: NOW })
  })
})

describe('a run is not opened', () => {
  const refusedAs = async (reason: string, over: Partial<Parameters<typeof openRun>[0]> = {}) => {
    const before = world.run.state
    expect(await open(over)).toEqual({ ok: false, reason })
    await world.run.reload()
    expect(world.run.state).toBe(before)
    expect(await BulkJob.count({ where: { runId: world.run.id } })).toBe(0)
  }

  test('on its decide-by day', () => refusedAs('decide_by_past', { now: new Date('2027-04-01T10:00:00Z') }))
  test('before its page is published', async () => {
    await world.module.update({ state: 'draft' })
    await refusedAs('page_not_published')
  })
  test('while the account cannot take cards', async () => {
    await world.workshop.update({ chargesEnabledAt: null })
    await refusedAs('account_cannot_charge')
  })
  test('without an account at all', async () => {
    await world.workshop.update({ providerAccountId: null, chargesEnabledAt: null, payoutsManualAt: null })
    await refusedAs('account_cannot_charge')
  })
  test('when the provider does not know the account', async () => {
    await world.workshop.update({ providerAccountId: 'acct_gone' })
    await refusedAs('provider_unreachable')
  })
  test('while the workshop is suspended', async () => {
    await world.workshop.update({ state: 'suspended', suspendedAt: NOW })
    await refusedAs('workshop_not_open')
  })
  test('beside another run of the module that takes deposits', async () => {
    await makeRun(world)
    await refusedAs('another_run_open')
  })
  test('when decide-by lies beyond the time deposits are kept, unless the owner says how', async () => {
    await world.workshop.update({ holdingLimitDays: 30 })
    await refusedAs('beyond_holding_limit')
    await world.run.update({ holdingPlan: 'They move to a savings account of their own.' })
    expect(await open()).toMatchObject({ ok: true })
  })
  test('twice', async () => {
    expect(await open()).toMatchObject({ ok: true })
    expect(await open()).toEqual({ ok: false, reason: 'not_allowed' })
    expect(await BulkJob.count({ where: { runId: world.run.id } })).toBe(1)
  })
  test('by two hands at once: one wins', async () => {
    const both = await Promise.all([open(), open()])
    expect(both.filter(({ ok }) => ok)).toHaveLength(1)
    expect(await BulkJob.count({ where: { runId: world.run.id } })).toBe(1)
  })
  test('by anyone but its owner', async () => {
    const { person } = await makeUser({ workshopId: world.workshop.id, role: 'bench' })
    await refusedAs('forbidden', { actor: await actorOf(person) })
    const other = await moneyWorld(draft)
    await refusedAs('forbidden', { actor: await actorOf(other.owner) })
    await refusedAs('not_found', { runId: other.run.id })
  })
})
