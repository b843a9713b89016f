import { describe, expect, test } from 'vitest'
import { refuseFields } from '@/lib/contracts/problem'
import { minor } from '@/lib/core/brand'
import { ok, refuse } from '@/lib/core/result'
import { signUpWords } from '@/lib/messages/signups'
import { deleteUnconfirmedSignUp } from '@/lib/services/signups/delete-unconfirmed-signup'
import { AuditEntry, DueItem, MailOutbox, Person, SignUp } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { signUp, statesOf, submit } from './sign-up-world'

async function house() {
  const made = await makeWorkshop()
  return { ...made, ...(await makeModule(made.workshop)) }
}
const confirm = ok({ next: 'confirm' })

describe('a statement of interest', () => {
  test('is written down unconfirmed, with one mail and the day it goes again; the answer names nobody', async () => {
    const world = await house()
    expect(await submit(world)).toEqual(confirm)
    const row = await SignUp.findOne({ where: { moduleId: world.module.id }, rejectOnEmpty: true })
    expect(row).toMatchObject({
      state: 'unconfirmed',
      quantity: 2,
      shownPriceMinor: 9500,
      topPriceMinor: null,
    })
    expect(row.takeBackTokenHash).toBeNull()
    const mail = await MailOutbox.findOne({ where: { subjectId: row.id }, rejectOnEmpty: true })
    // 14 days after 1 March, in Hamburg.
    expect(mail.props).toMatchObject({ deleteOn: '2027-03-15', quantity: 2, offer: 'kit' })
    expect(mail.kind).toBe('confirm_signup')
    expect(await DueItem.count({ where: { kind: 'signup_unconfirmed', subjectId: row.id } })).toBe(1)
    expect(await AuditEntry.count({ where: { subjectId: row.id, event: 'submit' } })).toBe(1)
  })

  test('is answered alike whoever asks, and one person is one whatever the case of the address', async () => {
    const world = await house()
    expect(await submit(world, { email: 'Grete@Example.org' })).toEqual(confirm)
    expect(await submit(world, { email: 'grete@example.org' })).toEqual(confirm)
    expect(await Person.count({ where: { emailNormal: 'grete@example.org' } })).toBe(1)
  })

  test('changes nothing of an earlier confirmed one until it is confirmed itself', async () => {
    const world = await house()
    await signUp(world, { email: 'again@example.org' })
    await submit(world, { email: 'again@example.org', quantity: 9 })
    expect((await statesOf(world.module.id)).sort()).toEqual(['confirmed', 'unconfirmed'])
    const counted = await SignUp.findOne({ where: { moduleId: world.module.id, state: 'confirmed' } })
    expect(counted?.quantity).toBe(2)
  })

  test('sends one address five mails an hour about a module, twenty in all, and answers on alike', async () => {
    const worlds = await Promise.all([house(), house(), house(), house(), house()])
    const email = 'full@example.org'
    for (const world of worlds)
      for (let time = 0; time < 6; time += 1) expect(await submit(world, { email })).toEqual(confirm)
    const person = await Person.findOne({ where: { emailNormal: email }, rejectOnEmpty: true })
    const mails = () => MailOutbox.count({ where: { kind: 'confirm_signup', personId: person.id } })
    expect(await mails()).toBe(20)
    await submit(worlds[0]!, { email }, hoursAfter(NOW, 2))
    expect(await mails()).toBe(21)
  })

  test('asks for the highest price only while the price is open, and keeps the list as it was shown', async () => {
    const world = await house()
    const prices = [minor(8500), minor(9500), minor(10500)]
    await world.offers.kit.update({ priceMinor: null, depositMinor: null, priceListMinor: prices })
    await submit(world, { topPriceMinor: 9500 })
    const row = await SignUp.findOne({ where: { moduleId: world.module.id }, rejectOnEmpty: true })
    expect(row).toMatchObject({ topPriceMinor: 9500, askedPricesMinor: prices, shownPriceMinor: null })
    expect(await submit(world, { topPriceMinor: 9600 })).toEqual(
      refuseFields({ topPriceMinor: signUpWords.priceUnknown }),
    )
    expect(await submit(world, { offer: 'built', topPriceMinor: 9500 })).toEqual(
      refuseFields({ topPriceMinor: signUpWords.priceUnknown }),
    )
  })
})

describe('is refused, and leaves no trace,', () => {
  test('for what is not public: unknown, draft, archived, of a workshop that is not open', async () => {
    const world = await house()
    const draft = await makeModule(world.workshop, { state: 'draft', publishedAt: null })
    const archived = await makeModule(world.workshop, { state: 'archived', archivedAt: NOW })
    const closed = await makeWorkshop({ state: 'suspended', suspendedAt: NOW })
    const theirs = await makeModule(closed.workshop)
    const elsewhere = await house()
    for (const named of [
      { workshop: world.workshop, module: { slug: 'nothing' } },
      { workshop: { slug: 'nobody' }, module: world.module },
      { workshop: world.workshop, module: draft.module },
      { workshop: world.workshop, module: archived.module },
      { workshop: closed.workshop, module: theirs.module },
      { workshop: world.workshop, module: elsewhere.module },
    ])
      expect(await submit(named, { email: 'nowhere@example.org' })).toEqual(refuse('not_found'))
    expect(await Person.count({ where: { emailNormal: 'nowhere@example.org' } })).toBe(0)
  })

  test('for a form it is not sold in, at the field', async () => {
    const world = await house()
    await world.offers.boards.update({ withdrawnAt: NOW })
    expect(await submit(world, { offer: 'boards' })).toEqual(
      refuseFields({ offer: signUpWords.offerUnknown }),
    )
  })

  test('for a country ISO 3166-1 has not assigned, at the field', async () => {
    const world = await house()
    for (const country of ['XX', 'ZZ', 'XK', 'EU'])
      expect(await submit(world, { country })).toEqual(refuseFields({ country: signUpWords.countryUnknown }))
    expect(await SignUp.count({ where: { moduleId: world.module.id } })).toBe(0)
  })
})

test('what nobody confirms is deleted; what was confirmed meanwhile stays', async () => {
  const world = await house()
  await submit(world, { email: 'never@example.org' })
  await signUp(world, { email: 'did@example.org' })
  const rows = await SignUp.findAll({ where: { moduleId: world.module.id } })
  for (const { id } of rows) await deleteUnconfirmedSignUp({ signUpId: id })
  expect(await statesOf(world.module.id)).toEqual(['confirmed'])
})
