import sharp from 'sharp'
import { beforeAll, expect, test } from 'vitest'
import { FileInput } from '@/lib/contracts/files'
import { refuse } from '@/lib/core/result'
import { getFilesDesk } from '@/lib/queries/modules-admin/get-files-desk'
import { addFile } from '@/lib/services/files/add-file'
import { openFile } from '@/lib/services/files/open-file'
import { removeFile } from '@/lib/services/files/remove-file'
import { StoredFile } from '@/models'
import { NOW } from '@/tests/support/worlds/base'
import { actorOf } from '@/tests/support/worlds/person'
import { pier } from '@/tests/support/worlds/pier'

let world: Awaited<ReturnType<typeof pier>>
let at: { actor: Awaited<ReturnType<typeof actorOf>>; workshopId: string; module: string; now: Date }
beforeAll(async () => {
  world = await pier()
  at = {
    ...{ actor: await actorOf(world.owner), workshopId: world.workshop.id, module: 'rowlock' },
    now: NOW,
  }
})

const canvas = (width: number, height: number) =>
  sharp({ create: { width, height, channels: 3, background: '#0b5563' } })
const input = (over: object = {}) =>
  FileInput.parse({ subject: 'module', alt: 'Front panel from the left', ...over })
const add = (content: Buffer, over: object = {}) =>
  addFile({ ...at, input: input(over), file: { name: 'front <1>.png', content } })
const idOf = (answer: Awaited<ReturnType<typeof add>>) => {
  if (!answer.ok) throw new Error(JSON.stringify(answer))
  return answer.value.file
}

test('a picture is drawn anew: nothing that came along stays, and a wide one is made narrower', async () => {
  const secret = 'Taken at 54.32 N'
  const taken = await canvas(3000, 1000)
    .withExif({ IFD0: { ImageDescription: secret } })
    .jpeg()
    .toBuffer()
  expect(taken.includes(secret)).toBe(true)
  const id = idOf(await add(taken))
  const kept = await openFile({ actor: { kind: 'visitor' }, file: id })
  expect(kept?.mediaType).toBe('image/webp')
  expect(kept?.content.includes(secret)).toBe(false)
  // 3000 × 1000 at 2400 wide.
  expect(await sharp(kept!.content).metadata()).toMatchObject({ width: 2400, height: 800 })
  const row = await StoredFile.findByPk(id, { rejectOnEmpty: true })
  expect(row).toMatchObject({ widthPx: 2400, heightPx: 800, fileName: 'front _1_.png', ownerScope: 'public' })
})

test.each<[string, () => Promise<Buffer>, RegExp]>([
  ['nothing', async () => Buffer.alloc(0), /not empty/],
  [
    'an SVG with a script',
    async () =>
      Buffer.from('<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg"><script>1</script></svg>'),
    /program/,
  ],
  // 10,000 × 6,000 is 60 megapixels; one colour, so that the file is small.
  ['60 megapixels', () => canvas(10_000, 6000).png({ compressionLevel: 9 }).toBuffer(), /50 megapixels/],
  [
    'a picture cut short',
    async () => (await canvas(64, 64).png().toBuffer()).subarray(0, 60),
    /cannot be read/,
  ],
  ['a program', async () => Buffer.from('MZ\u0090\u0000 this is no picture'), /no picture/],
])('%s is refused with a sentence at the file', { timeout: 30_000 }, async (_, make, words) => {
  expect(await add(await make())).toMatchObject({ errors: { file: expect.stringMatching(words) } })
})

test('the forty-first picture is one too many', { timeout: 30_000 }, async () => {
  const picture = await canvas(8, 8).png().toBuffer()
  const there = await StoredFile.count({ where: { subjectId: world.module.id, kind: 'picture' } })
  for (let i = there; i < 40; i += 1) idOf(await add(picture))
  expect(await add(picture)).toMatchObject({ errors: { file: expect.stringMatching(/40 pictures/) } })
  // Another thing of the module has its own count.
  expect(idOf(await add(picture, { subject: 'offer', offer: 'kit' }))).toBeTruthy()
})

test('what belongs to a revision is for those who work here; removed it is gone for all', async () => {
  const picture = await canvas(9, 9).png().toBuffer()
  const id = idOf(await add(picture, { subject: 'revision', revision: 'A' }))
  const stranger = await actorOf(world.fenLamp.owner)
  const bench = await actorOf(world.bench)
  expect(await openFile({ actor: { kind: 'visitor' }, file: id })).toBeNull()
  expect(await openFile({ actor: stranger, file: id })).toBeNull()
  expect(await openFile({ actor: bench, file: id })).toMatchObject({ isPublic: false })
  const desk = await getFilesDesk(at)
  expect(desk?.files.find((file) => file.id === id)).toMatchObject({ subject: 'revision', of: 'A' })
  expect(await removeFile({ ...at, actor: bench, file: id })).toEqual(refuse('forbidden'))
  expect(await removeFile({ ...at, file: id })).toMatchObject({ ok: true })
  expect(await removeFile({ ...at, file: id })).toEqual(refuse('not_found'))
  expect(await openFile({ actor: bench, file: id })).toBeNull()
})

test('a revision of another module, and a file from a stranger, are refused', async () => {
  const picture = await canvas(9, 9).png().toBuffer()
  expect(await add(picture, { subject: 'revision', revision: 'ZZ' })).toMatchObject({
    errors: { revision: expect.any(String) },
  })
  const actor = await actorOf(world.fenLamp.owner)
  const sent = { ...at, actor, input: input(), file: { name: 'x', content: picture } }
  expect(await addFile(sent)).toEqual(refuse('forbidden'))
  expect(FileInput.safeParse({ subject: 'module', alt: '' }).error?.issues[0]?.path).toEqual(['alt'])
})
