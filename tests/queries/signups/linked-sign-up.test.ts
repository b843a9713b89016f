import { expect, test } from 'vitest'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { getLinkedSignUp } from '@/lib/queries/signups/get-linked-sign-up'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

test('each link finds its sign-up and no other, and says whether it can still be confirmed', async () => {
  const { workshop } = await makeWorkshop()
  const { module, offers } = await makeModule(workshop)
  const { tokens } = await makeSignUp(offers.kit, { state: 'unconfirmed', quantity: 3 })
  const link = { confirmTokenHash: hashToken(tokens.confirm) }
  expect(await getLinkedSignUp(link, NOW)).toEqual({
    state: 'unconfirmed',
    isExpired: false,
    workshop: { slug: workshop.slug, name: workshop.name },
    module: { slug: module.slug, name: module.name },
    offer: 'kit',
    quantity: 3,
    country: 'DE',
    certainty: 'certain',
  })
  expect(await getLinkedSignUp(link, hoursAfter(NOW, 14 * 24))).toMatchObject({ isExpired: true })
  expect(await getLinkedSignUp({ takeBackTokenHash: hashToken(tokens.confirm) }, NOW)).toBeNull()
  expect(await getLinkedSignUp({ confirmTokenHash: hashToken(makeToken()) }, NOW)).toBeNull()
})

test('the link that takes back knows what became of it', async () => {
  const { workshop } = await makeWorkshop()
  const { offers } = await makeModule(workshop)
  const gone = await makeSignUp(offers.kit, { state: 'taken_back', takenBackAt: NOW })
  const link = { takeBackTokenHash: hashToken(gone.tokens.takeBack) }
  expect(await getLinkedSignUp(link, NOW)).toMatchObject({ state: 'taken_back', isExpired: false })
})
