import { beforeAll, describe, expect, test } from 'vitest'
import { POST as confirm } from '@/app/api/signups/confirm/route'
import { POST as takeBack } from '@/app/api/signups/take-back/route'
import { makeToken } from '@/lib/config/secrets'
import { SignUp } from '@/models'
import { setBusinessTime } from '@/tests/support/business-time'
import { NOW } from '@/tests/support/worlds/base'
import { makeModule } from '@/tests/support/worlds/module'
import { makeSignUp } from '@/tests/support/worlds/sign-up'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { postForm, postJson } from './post-form'

beforeAll(() => setBusinessTime(NOW))

async function house() {
  const { workshop } = await makeWorkshop()
  return makeModule(workshop)
}
const stateOf = async (id: string) => (await SignUp.findByPk(id, { rejectOnEmpty: true })).state

describe('confirming', () => {
  test('200 with the state, twice alike', async () => {
    const { signup, tokens } = await makeSignUp((await house()).offers.kit, { state: 'unconfirmed' })
    for (const _ of ['first', 'second']) {
      const answer = await postJson(confirm, '/api/signups/confirm', { token: tokens.confirm })
      expect(answer.status).toBe(200)
      expect(await answer.json()).toEqual({ state: 'confirmed' })
    }
    expect(await stateOf(signup.id)).toBe('confirmed')
  })

  test('404 for an unknown token, 409 for an expired one, 422 for half of one', async () => {
    const unknown = await postJson(confirm, '/api/signups/confirm', { token: makeToken() })
    expect(unknown.status).toBe(404)
    const late = await makeSignUp((await house()).offers.kit, { state: 'unconfirmed', confirmExpiresAt: NOW })
    const expired = await postJson(confirm, '/api/signups/confirm', { token: late.tokens.confirm })
    expect(expired.status).toBe(409)
    expect(await expired.json()).toMatchObject({ reason: 'token_expired' })
    const half = await postJson(confirm, '/api/signups/confirm', { token: makeToken().slice(20) })
    expect(half.status).toBe(422)
    expect(await stateOf(late.signup.id)).toBe('unconfirmed')
  })

  test('the page’s button leads back to the page, which says how it went', async () => {
    const { tokens } = await makeSignUp((await house()).offers.kit, { state: 'unconfirmed' })
    const done = await postForm(confirm, '/api/signups/confirm', { token: tokens.confirm })
    expect(done.status).toBe(303)
    expect(done.headers.get('location')).toBe(`/confirm/${tokens.confirm}?done=1`)
  })
})

describe('taking back', () => {
  test('200 with the state, twice alike; the button leads back to its page', async () => {
    const { signup, tokens } = await makeSignUp((await house()).offers.kit)
    const first = await postJson(takeBack, '/api/signups/take-back', { token: tokens.takeBack })
    expect(await first.json()).toEqual({ state: 'taken_back' })
    const again = await postForm(takeBack, '/api/signups/take-back', { token: tokens.takeBack })
    expect(again.headers.get('location')).toBe(`/take-back/${tokens.takeBack}?done=1`)
    expect(await stateOf(signup.id)).toBe('taken_back')
  })

  test('409 once a later sign-up has replaced it', async () => {
    const { offers } = await house()
    const { tokens } = await makeSignUp(offers.kit, { state: 'superseded', supersededAt: NOW })
    const answer = await postJson(takeBack, '/api/signups/take-back', { token: tokens.takeBack })
    expect(answer.status).toBe(409)
    expect(await answer.json()).toMatchObject({ reason: 'token_used' })
  })
})
