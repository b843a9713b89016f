import { makeModule } from './module'
import { makeOrder } from './order'
import { makePerson, makeUser } from './person'
import { makeAttempt } from './payment'
import { makeRun } from './run'
import { makeSignUp } from './sign-up'
import { makeWorkshop } from './workshop'

/**
 * Hollow Pier Modular, small: Mara owns it, Jonas sits at the bench, Lene packs. Its module Rowlock takes deposits for a
 * run of 3 to 5; Ines has a kit under deposit, Tom is confirmed but has not ordered, Hana stands outside.
 * A second workshop, Fen Lamp Circuits, is there to be kept out.
 */
export async function pier() {
  const house = await makeWorkshop({ slug: 'hollow-pier', name: 'Hollow Pier Modular' })
  const design = await makeModule(house.workshop, { slug: 'rowlock', name: 'Rowlock' })
  const { run, runOffers } = await makeRun({ ...house, ...design })
  const bench = await staff('jonas@hollow-pier.example', 'Jonas Reet', 'bench')
  const packer = await staff('lene@hollow-pier.example', 'Lene Quast', 'packer')

  const ines = await makePerson({ emailNormal: 'ines@example.org', name: 'Ines Sommer' })
  const tom = await makePerson({ emailNormal: 'tom@example.org', name: 'Tom Ashby' })
  const hana = await makePerson({ emailNormal: 'hana@example.org', name: 'Hana Mori' })
  await makeSignUp(design.offers.kit, { person: ines })
  const { signup, tokens } = await makeSignUp(design.offers.built, {
    person: tom,
    country: 'GB',
    certainty: 'likely',
  })
  const { order, lines, address } = await makeOrder({
    run,
    person: ines,
    lines: [{ offer: runOffers.kit, quantity: 1 }],
  })
  const attempt = await makeAttempt(order)

  const fenLamp = await makeWorkshop({
    slug: 'fen-lamp',
    name: 'Fen Lamp Circuits',
    currency: 'GBP',
    country: 'GB',
    timeZone: 'Europe/London',
  })
  return {
    ...house,
    ...design,
    run,
    runOffers,
    bench,
    packer,
    ines,
    tom,
    hana,
    signup,
    tokens,
    order,
    lines,
    address,
    attempt,
    fenLamp,
  }

  async function staff(emailNormal: string, name: string, role: 'bench' | 'packer') {
    const person = await makePerson({ emailNormal, name })
    await makeUser({ person, workshopId: house.workshop.id, role })
    return person
  }
}
