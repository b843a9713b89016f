import { expect, test } from 'vitest'
import { WorkshopInput } from '@/lib/contracts/workshops'
import { ok, refuse } from '@/lib/core/result'
import { finishOnboarding } from '@/lib/gateways/payments/fake/onboarding'
import { connectPaymentAccount } from '@/lib/services/workshops/connect-payment-account'
import { moveWorkshop } from '@/lib/services/workshops/move-workshop'
import { refreshPaymentAccount } from '@/lib/services/workshops/refresh-payment-account'
import { startWorkshop } from '@/lib/services/workshops/start-workshop'
import { AuditEntry, Membership, Workshop } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { actorOf, makePerson, makeUser } from '@/tests/support/worlds/person'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

const TYPED = {
  name: 'Wrack Line Works',
  slug: 'wrack-line',
  legalName: 'Mara Quill',
  country: 'de',
  currency: 'eur',
  timeZone: 'Europe/Berlin',
  replyTo: 'mara@example.org',
}
const input = (over: object = {}) => WorkshopInput.parse({ ...TYPED, ...over })
const someone = async (host = false) => actorOf((await makeUser()).person, { host })

test('whoever starts a workshop is its owner; it waits for the host', async () => {
  const actor = await someone()
  expect(await startWorkshop({ actor, input: input(), now: NOW })).toEqual(ok({ workshop: 'wrack-line' }))
  const row = await Workshop.findOne({ where: { slug: 'wrack-line' }, rejectOnEmpty: true })
  expect(row).toMatchObject({ state: 'pending', currency: 'EUR', country: 'DE', chargesEnabledAt: null })
  const members = await Membership.findAll({ where: { workshopId: row.id } })
  expect(members.map(({ personId, role }) => [personId, role])).toEqual([[actor.personId, 'owner']])
  const taken = await startWorkshop({ actor: await someone(), input: input(), now: NOW })
  expect(taken).toMatchObject({ errors: { slug: 'This address is taken. Choose another.' } })
  expect(await startWorkshop({ actor: { kind: 'visitor' }, input: input(), now: NOW })).toEqual(
    refuse('forbidden'),
  )
})

test('two at once: one gets the address, the other is told', async () => {
  const given = input({ slug: 'same-moment' })
  const answers = await Promise.all(
    [await someone(), await someone()].map((actor) => startWorkshop({ actor, input: given, now: NOW })),
  )
  expect(answers.filter(({ ok: started }) => started)).toHaveLength(1)
  expect(await Workshop.count({ where: { slug: 'same-moment' } })).toBe(1)
})

test.each<[string, object, string]>([
  ['a reserved address', { slug: 'sandbox' }, 'slug'],
  ['an address with a blank', { slug: 'wrack line' }, 'slug'],
  ['a country that is not assigned', { country: 'XX' }, 'country'],
  ['a currency that is none', { currency: 'QQQ' }, 'currency'],
  ['a zone nobody knows', { timeZone: 'Europe/Hamburg' }, 'timeZone'],
  ['an e-mail with a line break', { replyTo: 'a@b.example\nBcc: c@d.example' }, 'replyTo'],
  ['a name of blanks', { name: '   ' }, 'name'],
])('%s is refused at its field', (_, over, field) => {
  const read = WorkshopInput.safeParse({ ...TYPED, ...over })
  expect(read.error?.issues.map(({ path }) => path.join('.'))).toEqual([field])
})

test('only the host opens, suspends and reopens, in that order', async () => {
  const { workshop, owner } = await makeWorkshop({ state: 'pending', openedAt: null })
  const host = await someone(true)
  const move = (event: 'open' | 'suspend' | 'reopen', actor = host) =>
    moveWorkshop({ actor, slug: workshop.slug, event, now: NOW })
  expect(await move('open', await actorOf(owner))).toEqual(refuse('forbidden'))
  expect(await move('suspend')).toEqual(refuse('not_allowed'))
  expect(await move('open')).toEqual(ok({ workshop: workshop.slug, state: 'open' }))
  expect(await move('open')).toEqual(refuse('not_allowed'))
  expect(await move('suspend')).toMatchObject({ value: { state: 'suspended' } })
  expect((await workshop.reload()).suspendedAt).toEqual(NOW)
  expect(await move('reopen')).toMatchObject({ value: { state: 'open' } })
  expect((await workshop.reload()).suspendedAt).toBeNull()
  const moves = await AuditEntry.findAll({ where: { subjectId: workshop.id } })
  expect(moves.map(({ event }) => event).sort()).toEqual(['open', 'reopen', 'suspend'])
  expect(await moveWorkshop({ actor: host, slug: 'nobody-here', event: 'open', now: NOW })).toEqual(
    refuse('not_found'),
  )
})

test('a workshop gets one account however often it asks; once onboarded, cards and manual payouts are on', async () => {
  const { workshop, owner } = await makeWorkshop({
    providerAccountId: null,
    chargesEnabledAt: null,
    payoutsManualAt: null,
  })
  const actor = await actorOf(owner)
  const connect = () => connectPaymentAccount({ actor, workshopId: workshop.id, now: NOW })
  const links = await Promise.all([connect(), connect()])
  expect(links.map(({ ok: given }) => given)).toEqual([true, true])
  const account = (await workshop.reload()).providerAccountId
  if (account === null) throw new Error('no account was written down')
  expect((await connect()).ok).toBe(true)
  expect((await workshop.reload()).providerAccountId).toBe(account)

  expect(await refreshPaymentAccount({ account, now: NOW })).toMatchObject({
    value: { chargesEnabled: false },
  })
  expect((await workshop.reload()).chargesEnabledAt).toBeNull()
  await finishOnboarding(account)
  const ready = ok({ chargesEnabled: true, payoutsManual: true })
  expect(await refreshPaymentAccount({ account, now: NOW })).toEqual(ready)
  expect(await refreshPaymentAccount({ account, now: hoursAfter(NOW, 5) })).toEqual(ready)
  expect(await workshop.reload()).toMatchObject({ chargesEnabledAt: NOW, payoutsManualAt: NOW })
})

test('nobody connects an account for a workshop that is not theirs', async () => {
  const { workshop } = await makeWorkshop()
  const { owner } = await makeWorkshop()
  const packer = await makePerson()
  await makeUser({ person: packer, workshopId: workshop.id, role: 'packer' })
  for (const person of [owner, packer])
    expect(
      await connectPaymentAccount({ actor: await actorOf(person), workshopId: workshop.id, now: NOW }),
    ).toEqual(refuse('forbidden'))
  expect(await refreshPaymentAccount({ account: 'acct_of_nobody', now: NOW })).toMatchObject({ ok: false })
})
