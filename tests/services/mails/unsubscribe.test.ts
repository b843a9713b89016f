import { randomUUID } from 'node:crypto'
import { expect, test } from 'vitest'
import { refuse } from '@/lib/core/result'
import { unsubscribe } from '@/lib/services/mails/unsubscribe'
import { Suppression, type Person, type Workshop } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { makePerson } from '@/tests/support/worlds/person'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { queued, sent, useMailServer } from './mail-world'

const arrived = useMailServer()
const news = (person: Person, workshop: Workshop) =>
  queued('run_update', { person, workshopId: workshop.id, subjectId: `${randomUUID()}.${person.id}` })

async function tokenOfNews() {
  const { workshop } = await makeWorkshop()
  const person = await makePerson()
  await sent(await news(person, workshop))
  const header = arrived[0]?.headers['list-unsubscribe'] ?? ''
  const token = /^<http:\/\/localhost:3000\/api\/unsubscribe\/([\w-]{43})>$/.exec(header)?.[1] ?? ''
  return { workshop, person, token }
}

test('the one-click address ends news and invitations of that workshop, and nothing else', async () => {
  const { workshop, person, token } = await tokenOfNews()
  expect(arrived[0]?.headers['list-unsubscribe-post']).toBe('List-Unsubscribe=One-Click')
  expect(arrived[0]?.text).toContain(`http://localhost:3000/unsubscribe/${token}`)

  expect(await unsubscribe({ token, now: NOW })).toEqual({ ok: true, value: { workshopId: workshop.id } })
  expect(await unsubscribe({ token, now: NOW })).toEqual({ ok: true, value: { workshopId: workshop.id } })
  expect(await Suppression.count({ where: { workshopId: workshop.id } })).toBe(1)

  expect(await sent(await news(person, workshop))).toMatchObject({
    state: 'dropped',
    lastError: 'unsubscribed',
  })
  const contract = await queued('refund_sent', { person, workshopId: workshop.id, subjectId: randomUUID() })
  expect((await sent(contract)).state).toBe('sent')
  const { workshop: other } = await makeWorkshop()
  expect((await sent(await news(person, other))).state).toBe('sent')
})

test('the wish outlives the person: the hash stays after erasure and holds if they come back', async () => {
  const { workshop, person, token } = await tokenOfNews()
  const { emailNormal } = person
  await unsubscribe({ token, now: NOW })
  await person.update({ emailNormal: null, emailShown: null, name: null, erasedAt: NOW })
  const back = await makePerson({ emailNormal: emailNormal ?? '' })
  expect(await sent(await news(back, workshop))).toMatchObject({
    state: 'dropped',
    lastError: 'unsubscribed',
  })
})

test('the kept copy of a mail carries no link that unsubscribes', async () => {
  const { workshop } = await makeWorkshop()
  const mail = await sent(await news(await makePerson(), workshop))
  expect(`${mail.bodyText}${mail.bodyHtml}`).not.toContain('/unsubscribe/')
})

test.each(['', 'abc', 'A'.repeat(43), 'A'.repeat(44)])(
  'a link that was not made here is refused: %j',
  async (token) => {
    expect(await unsubscribe({ token, now: NOW })).toEqual(refuse('unknown_link'))
  },
)

test('a link with any one character changed is refused', async () => {
  const { workshop, token } = await tokenOfNews()
  for (const at of [0, 10, 21, 22, 30, 41]) {
    const changed = token.slice(0, at) + (token[at] === 'A' ? 'B' : 'A') + token.slice(at + 1)
    expect(await unsubscribe({ token: changed, now: NOW })).toEqual(refuse('unknown_link'))
  }
  expect(await Suppression.count({ where: { workshopId: workshop.id } })).toBe(0)
})
