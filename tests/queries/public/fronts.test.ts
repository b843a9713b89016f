import { expect, test } from 'vitest'
import { getSiteFront } from '@/lib/queries/public/get-site-front'
import { getWorkshopFront } from '@/lib/queries/public/get-workshop-front'
import { listPublicPages } from '@/lib/queries/public/list-public-pages'
import { NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { pier } from '@/tests/support/worlds/pier'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

test('the fronts show what is public: open workshops, published modules, those taking deposits first', async () => {
  const world = await pier()
  const later = await makeModule(world.workshop, { slug: 'newest', publishedAt: NOW })
  await makeModule(world.workshop, { slug: 'hidden', state: 'draft', publishedAt: null })
  const pending = await makeWorkshop({ slug: 'waiting', state: 'pending', openedAt: null })
  await makeModule(pending.workshop, { slug: 'theirs' })

  const front = await getSiteFront({ now: NOW })
  expect(front.workshops.map(({ slug, modules }) => [slug, modules])).toEqual([
    ['hollow-pier', 2],
    ['fen-lamp', 0],
  ])
  expect(front.modules.map(({ slug }) => slug)).toEqual(['rowlock', 'newest'])
  expect(front.modules[0]?.run).toEqual({
    state: 'taking_deposits',
    deposited: 1,
    minimum: 3,
    maximum: 5,
    decideBy: '2027-04-01',
    daysLeft: 31,
  })
  expect(front.modules[1]?.run).toBeNull()

  const own = await getWorkshopFront({ slug: 'hollow-pier', now: NOW })
  expect(own?.modules.map(({ slug }) => slug)).toEqual(['rowlock', later.module.slug])
  expect(await getWorkshopFront({ slug: 'waiting', now: NOW })).toBeNull()
  expect(await getWorkshopFront({ slug: 'nobody', now: NOW })).toBeNull()

  expect(await listPublicPages()).toEqual([
    { workshop: 'fen-lamp', modules: [] },
    { workshop: 'hollow-pier', modules: ['newest', 'rowlock'] },
  ])
})

test('a suspended workshop’s own front stays; the front of the site leaves it out', async () => {
  const { workshop } = await makeWorkshop({ slug: 'paused', state: 'suspended', suspendedAt: NOW })
  await makeModule(workshop, { slug: 'kept' })
  expect(await getWorkshopFront({ slug: 'paused', now: NOW })).toMatchObject({ isOpen: false })
  const front = await getSiteFront({ now: NOW })
  expect(front.workshops.map(({ slug }) => slug)).not.toContain('paused')
  expect(front.modules.map(({ slug }) => slug)).not.toContain('kept')
})
