import { describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { Invitation, Membership, Person } from '@/models'
import { NOW } from '../support/worlds/base'
import { makePerson, makeUser } from '../support/worlds/person'
import { makeRun } from '../support/worlds/run'
import { makeSignUp } from '../support/worlds/sign-up'
import { makeWorkshop } from '../support/worlds/workshop'
import { refusedBy } from './refused-by'

describe('sign-ups', () => {
  test('one is confirmed per module and person; unconfirmed ones may wait beside it', async () => {
    const { offers } = await makeRun()
    const { person, signup } = await makeSignUp(offers.kit)
    await makeSignUp(offers.built, { person, state: 'unconfirmed' })
    expect(await refusedBy(() => makeSignUp(offers.built, { person }))).toBe('signups_one_confirmed_key')
    await signup.update({ state: 'superseded', supersededAt: NOW })
    await makeSignUp(offers.built, { person })
  })

  test('are for 1 to 10 of an offer', async () => {
    const { offers } = await makeRun()
    for (const quantity of [0, 11]) {
      expect(await refusedBy(() => makeSignUp(offers.kit, { quantity }))).toBe('signups_quantity_check')
    }
    const free = () => makeSignUp(offers.kit, { topPriceMinor: minor(0) })
    expect(await refusedBy(free)).toBe('signups_top_price_minor_check')
  })

  test('are invited once per run', async () => {
    const { offers, run } = await makeRun()
    const { signup, person } = await makeSignUp(offers.kit)
    const invitation = {
      workshopId: run.workshopId,
      runId: run.id,
      signupId: signup.id,
      personId: person.id,
      sentAt: NOW,
    }
    await Invitation.create(invitation)
    expect(await refusedBy(() => Invitation.create(invitation))).toBe('invitations_run_id_signup_id_key')
  })
})

describe('people', () => {
  test('are found by one spelling of their address', async () => {
    await makePerson({ emailNormal: 'only.one@example.org' })
    const again = () => makePerson({ emailNormal: 'only.one@example.org' })
    expect(await refusedBy(again)).toBe('people_email_normal_key')
    for (const emailNormal of [
      'Only.One@example.org',
      'a b@example.org',
      'a@example.org\nBcc: b@example.org',
    ]) {
      expect(await refusedBy(() => makePerson({ emailNormal }))).toBe('people_email_normal_lower_check')
    }
  })

  test('are erased whole', async () => {
    const person = await makePerson()
    const partly = () => Person.update({ erasedAt: NOW, emailNormal: null }, { where: { id: person.id } })
    expect(await refusedBy(partly)).toBe('people_erased_blank_check')
    await person.update({ erasedAt: NOW, emailNormal: null, emailShown: null, name: null })
  })

  test('act for a workshop in one role', async () => {
    const { workshop, owner } = await makeWorkshop()
    const membership = {
      workshopId: workshop.id,
      personId: owner.id,
      role: 'packer',
      createdAt: NOW,
    } as const
    expect(await refusedBy(() => Membership.create(membership))).toBe('memberships_person_id_key')
    const wrong = () => makeUser({ workshopId: workshop.id, role: 'admin' as never })
    expect(await refusedBy(wrong)).toBe('memberships_role_check')
  })
})
