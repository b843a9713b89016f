import { describe, expect, test } from 'vitest'
import { POST } from '@/app/api/signups/route'
import type { Problem } from '@/lib/contracts/problem'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { FormDraft, SignUp } from '@/models'
import { makeModule } from '@/tests/support/worlds/module'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { postForm, postJson } from './post-form'

const path = '/api/signups'
async function house() {
  const { workshop } = await makeWorkshop()
  const { module, offers } = await makeModule(workshop)
  const good = {
    workshop: workshop.slug,
    module: module.slug,
    offer: 'kit',
    quantity: '3',
    country: 'AT',
    certainty: 'certain',
    email: `${module.slug}@example.org`,
  }
  return { workshop, module, offers, good }
}
const countOf = (moduleId: string) => SignUp.count({ where: { moduleId } })

describe('as JSON', () => {
  test('202, and the same for an address known and unknown', async () => {
    const { good } = await house()
    for (const email of ['one@example.org', 'one@example.org', 'two@example.org']) {
      const answer = await postJson(POST, path, { ...good, quantity: 3, email, updates: false })
      expect(answer.status).toBe(202)
      expect(await answer.json()).toEqual({ next: 'confirm' })
    }
  })

  const wrong: [string, Record<string, unknown>, string, RegExp][] = [
    ['quantity 0', { quantity: 0 }, 'quantity', /whole number from 1 to 10/],
    ['quantity 11', { quantity: 11 }, 'quantity', /whole number from 1 to 10/],
    ['quantity 1.5', { quantity: 1.5 }, 'quantity', /whole number from 1 to 10/],
    ['quantity "1e3"', { quantity: '1e3' }, 'quantity', /whole number from 1 to 10/],
    ['an unknown offer', { offer: 'gold' }, 'offer', /Choose one of the offers/],
    ['an unknown country', { country: 'XX' }, 'country', /Choose a country/],
    ['a country in words', { country: 'Austria' }, 'country', /Choose a country/],
    [
      'an e-mail with a line break',
      { email: 'a@example.org\nBcc: b@example.org' },
      'email',
      /e-mail address/,
    ],
    ['no certainty', { certainty: '' }, 'certainty', /how sure/],
    ['a price nobody asked about', { topPriceMinor: 100 }, 'topPriceMinor', /prices shown/],
  ]
  test.each(wrong)('422 at the field for %s; nothing is written', async (_name, over, field, sentence) => {
    const { good, module } = await house()
    const answer = await postJson(POST, path, { ...good, ...over })
    expect(answer.status).toBe(422)
    expect(answer.headers.get('content-type')).toBe('application/problem+json')
    const problem = (await answer.json()) as Problem
    expect(problem.errors?.[field]).toMatch(sentence)
    expect(await countOf(module.id)).toBe(0)
  })

  test('404 for what is not public', async () => {
    const { good } = await house()
    expect((await postJson(POST, path, { ...good, module: 'nothing' })).status).toBe(404)
  })

  test('403 from another site, 415 for another type, 413 for 10 MB, 400 for what is no JSON', async () => {
    const { good, module } = await house()
    const foreign = await postJson(POST, path, good, { headers: { origin: 'https://elsewhere.example' } })
    expect(foreign.status).toBe(403)
    const typed = await postJson(POST, path, good, { headers: { 'content-type': 'text/plain' } })
    expect(typed.status).toBe(415)
    const large = await postJson(POST, path, { ...good, email: 'x'.repeat(10_000_000) })
    expect(large.status).toBe(413)
    const broken = await postForm(POST, path, good, { headers: { 'content-type': 'application/json' } })
    expect(broken.status).toBe(400)
    expect(await countOf(module.id)).toBe(0)
  })
})

describe('as a form without JavaScript', () => {
  test('303 to the page that says what comes next', async () => {
    const { good, workshop, module } = await house()
    const answer = await postForm(POST, path, { ...good, updates: 'on', topPriceMinor: '' })
    expect(answer.status).toBe(303)
    expect(answer.headers.get('location')).toBe(`/w/${workshop.slug}/${module.slug}/sent`)
    const row = await SignUp.findOne({ where: { moduleId: module.id }, rejectOnEmpty: true })
    expect(row).toMatchObject({ quantity: 3, country: 'AT', wantsUpdates: true, topPriceMinor: null })
  })

  test('303 back to the form, with everything typed and a sentence at each field', async () => {
    const { good, workshop, module } = await house()
    const typed = { ...good, quantity: '11', email: 'no address', country: 'AT' }
    const answer = await postForm(POST, path, typed)
    expect(answer.status).toBe(303)
    const back = new RegExp(`^/w/${workshop.slug}/${module.slug}/form/([\\w-]{32})$`)
    const draft = back.exec(answer.headers.get('location') ?? '')?.[1]
    const kept = await getFormDraft(draft, 'signup')
    expect(kept?.values).toEqual(typed)
    expect(Object.keys(kept?.errors ?? {}).sort()).toEqual(['email', 'quantity'])
    expect(await getFormDraft(draft, 'workshop')).toBeNull()
    expect(await countOf(module.id)).toBe(0)
  })

  test('what was typed is gone after 15 minutes', async () => {
    const { good } = await house()
    const answer = await postForm(POST, path, { ...good, quantity: '0' })
    const draft = answer.headers.get('location')!.split('/').at(-1)!
    const row = await FormDraft.findByPk(draft, { rejectOnEmpty: true })
    expect(row.expiresAt.getTime() - Date.now()).toBeLessThanOrEqual(15 * 60_000)
    await row.update({ expiresAt: new Date(Date.now() - 1) })
    expect(await getFormDraft(draft, 'signup')).toBeNull()
  })
})
