import { expect, test } from 'vitest'
import { GET, POST } from '@/app/api/unsubscribe/[token]/route'
import { ok, refuse } from '@/lib/core/result'
import { unsubscribeToken } from '@/lib/services/_steps/unsubscribe-token'
import { showUnsubscribe } from '@/lib/services/mails/show-unsubscribe'
import { Suppression } from '@/models'
import { postForm } from '@/tests/http/signups/post-form'
import { queued } from '@/tests/services/mails/mail-world'
import { makePerson } from '@/tests/support/worlds/person'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

async function news() {
  const { workshop } = await makeWorkshop()
  const person = await makePerson()
  const subjectId = `update.${person.id}`
  const mail = await queued('run_update', { person, workshopId: workshop.id, subjectId })
  const token = unsubscribeToken(mail.id)
  const wishes = () => Suppression.count({ where: { workshopId: workshop.id } })
  return { workshop, token, path: `/api/unsubscribe/${token}`, params: { token }, wishes }
}

test('one click of a mail program ends the mails: no cookie, no origin, the form of RFC 8058', async () => {
  const { path, params, wishes } = await news()
  const request = new Request(`http://localhost:3000${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/x-www-form-urlencoded' },
    body: 'List-Unsubscribe=One-Click',
  })
  expect((await POST(request, { params: Promise.resolve(params) })).status).toBe(200)
  expect(await wishes()).toBe(1)
})

test('looking ends nothing: the address leads to a page that asks and names the workshop', async () => {
  const { workshop, token, path, params, wishes } = await news()
  const answer = await GET(new Request(`http://localhost:3000${path}`), { params: Promise.resolve(params) })
  expect(answer.status).toBe(303)
  expect(answer.headers.get('location')).toBe(`/unsubscribe/${token}`)
  expect(await showUnsubscribe({ token })).toEqual(ok({ workshop: workshop.name }))
  expect(await wishes()).toBe(0)
})

test('the button of that page comes back to it, twice alike', async () => {
  const { token, path, params, wishes } = await news()
  for (const _ of ['first', 'second']) {
    const answer = await postForm(POST, path, {}, { params })
    expect(answer.status).toBe(303)
    expect(answer.headers.get('location')).toBe(`/unsubscribe/${token}?done=1`)
  }
  expect(await wishes()).toBe(1)
})

test('a link nobody made, or cut off, is 404 and ends nothing', async () => {
  const { token } = await news()
  const changed = `${token.slice(0, -2)}${token.endsWith('AA') ? 'BB' : 'AA'}`
  for (const bad of [changed, token.slice(0, 30), 'short'])
    expect((await postForm(POST, `/api/unsubscribe/${bad}`, {}, { params: { token: bad } })).status).toBe(
      bad === 'short' ? 404 : 303,
    )
  expect(await showUnsubscribe({ token: changed })).toEqual(refuse('unknown_link'))
})
