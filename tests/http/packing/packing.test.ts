import { beforeAll, describe, expect, test } from 'vitest'
import { GET as list } from '@/app/api/packing/[workshop]/list.pdf/route'
import { POST as handOver } from '@/app/api/packing/[workshop]/parcels/[parcel]/hand-over/route'
import { POST as pack } from '@/app/api/packing/[workshop]/parcels/[parcel]/pack/route'
import { POST as reopen } from '@/app/api/packing/[workshop]/parcels/[parcel]/reopen/route'
import { GET as slip } from '@/app/api/packing/[workshop]/parcels/[parcel]/slip.pdf/route'
import { GET as queue } from '@/app/api/packing/[workshop]/queue/route'
import { GET as slips } from '@/app/api/packing/[workshop]/slips.pdf/route'
import { POST as fill } from '@/app/api/packing/[workshop]/fill/route'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { FormDraft } from '@/models'
import { readCode128 } from '@/tests/emails/papers/read-code-128'
import { readPdf } from '@/tests/emails/papers/read-pdf'
import { sessionOf } from '@/tests/http/matrix/people'
import { postForm, postJson } from '@/tests/http/signups/post-form'
import { elsewhere, packingWorld } from '@/tests/services/packing/packing-world'

/** Points; 0.33 mm. */
const MODULE_WIDTH = 0.95

let world: Awaited<ReturnType<typeof packingWorld>>
let cookie: string
beforeAll(async () => {
  world = await packingWorld()
  cookie = `${SESSION_COOKIE}=${await sessionOf(world.lene)}`
})

type Handler = Parameters<typeof postJson>[0]
const at = (rest: string) => `/api/packing/${world.workshop.slug}/${rest}`
const paramsOf = (parcel?: string) => ({ workshop: world.workshop.slug, ...(parcel && { parcel }) })
const get = (
  handler: Handler,
  rest: string,
  { parcel, as = cookie }: { parcel?: string; as?: string } = {},
) =>
  handler(new Request(`http://localhost:3000${at(rest)}`, { headers: { cookie: as } }), {
    params: Promise.resolve(paramsOf(parcel)),
  })
const send = (handler: Handler, deed: string, parcel: string, body: unknown, as = cookie) =>
  postJson(handler, at(`parcels/${parcel}/${deed}`), body, {
    params: paramsOf(parcel),
    headers: { cookie: as },
  })
const sendForm = (handler: Handler, deed: string, parcel: string, fields: Record<string, string>) =>
  postForm(handler, at(`parcels/${parcel}/${deed}`), fields, {
    params: paramsOf(parcel),
    headers: { cookie },
  })
const pageOf = (parcel: string) => `/packing/${world.workshop.slug}/parcels/${parcel}`

test('from the queue to the post, as the contract says it', async () => {
  const { order, lines, parcel } = await world.queued([{ offer: world.runOffers.kit, quantity: 2 }])
  const found = (await (await get(queue, 'queue')).json()) as { items: Record<string, unknown>[]; next: null }
  expect(found.items).toMatchObject([
    {
      order: order.id,
      number: String(order.number),
      country: 'DE',
      lines: [{ line: lines[0]!.id, offer: 'kit', quantity: 2 }],
      parcel: parcel.id,
    },
  ])
  expect(found.next).toBeNull()

  const body = { lines: [{ line: lines[0]!.id, quantity: 2 }], grams: 400 }
  const surprised = await send(pack, 'pack', parcel.id, body)
  expect(surprised.status).toBe(409)
  expect(await surprised.json()).toMatchObject({ reason: 'weight_surprise' })
  expect((await send(pack, 'pack', parcel.id, { ...body, weightConfirmed: true })).status).toBe(200)
  expect((await send(reopen, 'reopen', parcel.id, {})).status).toBe(200)
  expect((await send(pack, 'pack', parcel.id, { ...body, grams: 845, lengthMm: 250 })).status).toBe(200)
  expect(((await (await get(queue, 'queue')).json()) as { items: unknown[] }).items).toEqual([])

  const wrong = await send(handOver, 'hand-over', parcel.id, { service: 'Parcel', tracking: 'RR473124828GB' })
  expect(wrong.status).toBe(422)
  expect(await wrong.json()).toMatchObject({ errors: { tracking: expect.stringContaining('check digit') } })
  const done = await send(handOver, 'hand-over', parcel.id, { service: 'Parcel', tracking: 'RR473124829GB' })
  expect(done.status).toBe(200)
  expect(await done.json()).toMatchObject({ state: 'handed_over', order: 'posted' })
  expect((await send(handOver, 'hand-over', parcel.id, { service: 'Parcel' })).status).toBe(409)
})

describe('bad input', () => {
  test.each([
    [{ grams: 0 }, 'grams'],
    [{ grams: 40_001 }, 'grams'],
    [{ grams: 1.5 }, 'grams'],
    [{ grams: '1e3' }, 'grams'],
    [{ lengthMm: -1 }, 'lengthMm'],
    [{ lines: [] }, 'lines'],
    [{ lines: undefined }, 'lines'],
    [{ lines: [{ line: 'x', quantity: 1 }] }, 'lines.0.line'],
  ])('%j is refused at its field', async (change, field) => {
    const { lines, parcel } = await world.queued()
    const body = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420, ...change }
    const answer = await send(pack, 'pack', parcel.id, body)
    expect(answer.status).toBe(422)
    expect(Object.keys(((await answer.json()) as { errors: object }).errors)).toContain(field)
  })

  test('a cursor that was tampered with, an unknown offer', async () => {
    expect((await get(queue, 'queue?after=nonsense')).status).toBe(422)
    expect((await get(queue, 'queue?offer=gift')).status).toBe(422)
    expect((await get(queue, 'queue?offer=&country=')).status).toBe(200)
  })
})

describe('who', () => {
  test('the packer and the owner; nobody else learns that the parcel exists', async () => {
    const { lines, parcel } = await world.queued()
    const body = { lines: [{ line: lines[0]!.id, quantity: 1 }], grams: 420 }
    const { owner: stranger } = await elsewhere()
    const foreign = `${SESSION_COOKIE}=${await sessionOf(stranger)}`
    expect((await send(pack, 'pack', parcel.id, body, foreign)).status).toBe(404)
    expect((await get(queue, 'queue', { as: foreign })).status).toBe(404)
    expect(
      (await get(slip, `parcels/${parcel.id}/slip.pdf`, { parcel: parcel.id, as: foreign })).status,
    ).toBe(404)
    expect((await get(list, 'list.pdf', { as: foreign })).status).toBe(404)
    expect((await get(queue, 'queue', { as: '' })).status).toBe(401)
    const owner = `${SESSION_COOKIE}=${await sessionOf(world.owner)}`
    expect((await send(pack, 'pack', parcel.id, body, owner)).status).toBe(200)
  })

  test('a change from another site is refused', async () => {
    const { parcel } = await world.queued()
    const answer = await postJson(
      reopen,
      at(`parcels/${parcel.id}/reopen`),
      {},
      {
        params: paramsOf(parcel.id),
        headers: { cookie, origin: 'https://evil.example' },
      },
    )
    expect(answer.status).toBe(403)
  })
})

describe('as plain forms', () => {
  test('ticked lines are packed; the browser goes on to the parcel', async () => {
    const { lines, parcel } = await world.queued([{ offer: world.runOffers.kit, quantity: 1 }])
    const fields = {
      'lines.0.line': lines[0]!.id,
      'lines.0.quantity': '1',
      grams: '421',
      lengthMm: '',
      serials: '',
    }
    const answer = await sendForm(pack, 'pack', parcel.id, fields)
    expect([answer.status, answer.headers.get('location')]).toEqual([303, pageOf(parcel.id)])
    expect((await parcel.reload()).state).toBe('packed')
    const typed = { service: 'Parcel', tracking: '' }
    expect((await sendForm(handOver, 'hand-over', parcel.id, typed)).status).toBe(303)
    expect(await parcel.reload()).toMatchObject({ state: 'handed_over', tracking: null })
  })

  test('a line nobody ticked comes back by name, a surprise with its reason', async () => {
    const { lines, parcel } = await world.queued([
      { offer: world.runOffers.kit, quantity: 1 },
      { offer: world.runOffers.boards, quantity: 1 },
    ])
    const both = { 'lines.0.quantity': '1', 'lines.1.quantity': '1', grams: '420' }
    const draftOf = async (fields: Record<string, string>) => {
      const answer = await sendForm(pack, 'pack', parcel.id, fields)
      const location = new URL(answer.headers.get('location') ?? '', 'http://localhost:3000')
      expect([answer.status, location.pathname]).toEqual([303, pageOf(parcel.id)])
      return FormDraft.findByPk(location.searchParams.get('draft')!, { rejectOnEmpty: true })
    }
    const one = await draftOf({ ...both, 'lines.0.line': lines[0]!.id })
    expect(one.errors.lines).toContain('PCB and front panel set')
    expect(one.values).toMatchObject({ grams: '420', 'lines.0.line': lines[0]!.id })
    expect((await draftOf(both)).errors.lines).toBe('Tick the lines that are in the parcel.')
    const ticked = { 'lines.0.line': lines[0]!.id, 'lines.1.line': lines[1]!.id }
    expect((await draftOf({ ...both, ...ticked })).reason).toBe('weight_surprise')
    const right = { ...both, ...ticked, weightConfirmed: 'on' }
    expect((await sendForm(pack, 'pack', parcel.id, right)).headers.get('location')).toBe(pageOf(parcel.id))
    expect((await parcel.reload()).state).toBe('packed')
  })

  test('the queue is filled by one button', async () => {
    await world.paidOrder()
    const answer = await postForm(fill, at('fill'), {}, { params: paramsOf(), headers: { cookie } })
    expect([answer.status, answer.headers.get('location')]).toEqual([303, `/packing/${world.workshop.slug}`])
  })
})

describe('papers', () => {
  test('list and slips of the queue, and one parcel’s slip, as PDF that nobody keeps', async () => {
    const { parcel } = await world.queued()
    for (const answer of [
      await get(list, 'list.pdf?size=Letter'),
      await get(slips, 'slips.pdf'),
      await get(slip, `parcels/${parcel.id}/slip.pdf`, { parcel: parcel.id }),
    ]) {
      expect(answer.status).toBe(200)
      expect(answer.headers.get('content-type')).toBe('application/pdf')
      expect(answer.headers.get('cache-control')).toBe('no-store')
      expect(
        Buffer.from(await answer.arrayBuffer())
          .subarray(0, 5)
          .toString(),
      ).toBe('%PDF-')
    }
    expect((await parcel.reload()).printedAt).not.toBeNull()
    expect((await get(list, 'list.pdf?size=A5')).status).toBe(422)
  })

  test('the slip carries the bar code of its order', async () => {
    const { order, parcel } = await world.queued()
    const answer = await get(slip, `parcels/${parcel.id}/slip.pdf`, { parcel: parcel.id })
    const [page, ...more] = readPdf(Buffer.from(await answer.arrayBuffer()))
    expect(more).toEqual([])
    expect(readCode128(page!.bars, MODULE_WIDTH)).toBe(String(order.number))
    expect(page!.texts.join(' ')).toContain(`/account/orders/${order.id}`)
  })
})
