import { describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { sequelize } from '@/lib/db/sequelize'
import { getModulePage } from '@/lib/queries/public/get-module-page'
import { Choice, ChoiceAnswer, TermsVersion } from '@/models'
import { at, hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeOrder } from '@/tests/support/worlds/order'
import { makeRun } from '@/tests/support/worlds/run'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

type Named = { workshop: { slug: string }; module: { slug: string } }
const pageOf = ({ workshop, module }: Named, now = NOW) =>
  getModulePage({ workshop: workshop.slug, module: module.slug, now })
const runOf = async (named: Named, now = NOW) => (await pageOf(named, now))!.run!

/** Statements sent while something runs. */
async function statements(during: () => Promise<unknown>): Promise<number> {
  const { options } = sequelize as unknown as { options: { logging: false | (() => void) } }
  let count = 0
  options.logging = () => void (count += 1)
  await during().finally(() => (options.logging = false))
  return count
}

describe('the public page of a module', () => {
  test('tells who sells, by which terms, in which forms', async () => {
    const { workshop } = await makeWorkshop()
    const { module, offers } = await makeModule(workshop)
    const choice = await Choice.create({
      workshopId: workshop.id,
      offerId: offers.built.id,
      question: 'Front panel finish',
    })
    for (const [position, label] of ['Bare', 'Black'].entries())
      await ChoiceAnswer.create({
        workshopId: workshop.id,
        choiceId: choice.id,
        label,
        surchargeMinor: minor(position === 0 ? 0 : 900),
        position: position + 1,
      })
    const page = (await pageOf({ workshop, module }))!
    expect(page.maker).toMatchObject({
      legalName: 'Mara Quill',
      address: ['Mara Quill', 'Am Kai 3', '20457 Hamburg', 'GERMANY'],
    })
    expect(page.terms).toMatchObject({ number: 1, publishedOn: '2027-03-01' })
    expect(page.offers.map(({ offer, priceMinor }) => [offer, priceMinor])).toEqual([
      ['boards', 4500],
      ['kit', 9500],
      ['built', 16500],
    ])
    expect(page.offers[2]?.choices).toEqual([
      {
        question: 'Front panel finish',
        answers: [
          { label: 'Bare', surchargeMinor: 0 },
          { label: 'Black', surchargeMinor: 900 },
        ],
      },
    ])
    expect(page.countries).toEqual(['AT', 'DE', 'GB', 'JP', 'US'])
    expect(page.run).toBeNull()
  })

  test('shows what a run sells for, under the terms it was opened with', async () => {
    const world = await makeRun()
    await world.offers.kit.update({ priceMinor: minor(9900) })
    await TermsVersion.create({
      workshopId: world.workshop.id,
      number: 2,
      body: 'Later terms, which do not bind those who order in this run.',
      publishedAt: NOW,
      publishedByPersonId: world.workshop.createdByPersonId,
    })
    const page = (await pageOf(world))!
    expect(page.offers.find(({ offer }) => offer === 'kit')?.priceMinor).toBe(9500)
    expect(page.terms?.number).toBe(1)
  })

  test('takes as many statements with many orders, sign-ups and earlier runs as with none', async () => {
    const world = await makeRun(undefined, { maximum: 200 })
    const few = await statements(() => pageOf(world))
    for (let i = 0; i < 25; i += 1) {
      await makeSignUp(world.offers.kit)
      await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 1 }] })
    }
    expect(await statements(() => pageOf(world))).toBe(few)
    expect(few).toBeLessThanOrEqual(18)
  })

  test('is not there for a draft, for a workshop the host has not opened, for a name of another workshop', async () => {
    const { workshop } = await makeWorkshop()
    const draft = await makeModule(workshop, { state: 'draft', publishedAt: null })
    const pending = await makeWorkshop({ state: 'pending', openedAt: null })
    const theirs = await makeModule(pending.workshop)
    expect(await pageOf({ workshop, module: draft.module })).toBeNull()
    expect(await pageOf({ workshop: pending.workshop, module: theirs.module })).toBeNull()
    expect(await pageOf({ workshop, module: theirs.module })).toBeNull()
  })

  test('stays for those who ordered while its workshop is suspended, and takes nothing new', async () => {
    const world = await makeRun()
    await world.workshop.update({ state: 'suspended', suspendedAt: NOW })
    const page = (await pageOf(world))!
    expect(page.workshop.isOpen).toBe(false)
    expect(page.run?.takesOrders).toBe(false)
  })
})

describe('days of a run are the workshop’s own', () => {
  test('decide-by 1 April: 31 days left on 1 March, none on the day itself, over on the next', async () => {
    const world = await makeRun()
    expect(await runOf(world)).toMatchObject({ daysLeft: 31, takesOrders: true })
    // 23:30 on 1 April in Hamburg is still the day, although it is 21:30 in UTC.
    expect(await runOf(world, at('2027-04-01T21:30:00Z'))).toMatchObject({ daysLeft: 0, takesOrders: true })
    expect(await runOf(world, at('2027-04-01T22:30:00Z'))).toMatchObject({ daysLeft: -1, takesOrders: false })
  })

  test('only those invited order during the head start; a run without a free place is full', async () => {
    const world = await makeRun(undefined, { opensToAllAt: hoursAfter(NOW, 48), maximum: 3 })
    expect(await runOf(world)).toMatchObject({ isOpenToAll: false, isFull: false })
    expect(await runOf(world, hoursAfter(NOW, 48))).toMatchObject({ isOpenToAll: true })
    await makeOrder({ run: world.run, lines: [{ offer: world.runOffers.kit, quantity: 3 }] })
    expect(await runOf(world)).toMatchObject({ isFull: true, deposited: 3 })
  })

  test('thirty days without news after the lock are told; news ends it', async () => {
    const world = await makeRun(undefined, { state: 'locked', lockedAt: NOW })
    const silence = async (days: number) => (await runOf(world, hoursAfter(NOW, days * 24))).silentDays
    expect(await silence(29)).toBeNull()
    expect(await silence(30)).toBe(30)
    await world.run.update({ lastUpdateAt: hoursAfter(NOW, 10 * 24) })
    expect(await silence(30)).toBeNull()
    expect(await silence(41)).toBe(31)
  })
})
