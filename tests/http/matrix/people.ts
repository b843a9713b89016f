import { randomUUID } from 'node:crypto'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { BulkJob, Membership, Part, Session, User, type Person } from '@/models'
import { pier } from '@/tests/support/worlds/pier'
import { makeParcel } from '@/tests/support/worlds/parcel'
import { makeInvoice } from '@/tests/support/worlds/payment'
import { makePerson, makeUser } from '@/tests/support/worlds/person'
import { NOW } from '@/tests/support/worlds/base'
import type { MatrixRole } from './roles'

/** The small world with one thing of each kind, somebody in every role, and the parts of every address. */
export async function matrixWorld() {
  const world = await pier()
  const { parcel } = await makeParcel(world.order, world.lines)
  const bulk = await BulkJob.create({
    workshopId: world.workshop.id,
    kind: 'invite',
    runId: world.run.id,
    createdAt: NOW,
    byPersonId: world.owner.id,
    doneAt: NOW,
  })
  const part = await Part.create({ workshopId: world.workshop.id, code: 'JACK-35', createdAt: NOW })
  const host = await makePerson({ emailNormal: 'host@brimline.example' })
  const people: Record<Exclude<MatrixRole, 'visitor'>, Person> = {
    customer: world.ines,
    owner: world.owner,
    bench: world.bench,
    packer: world.packer,
    host,
    stranger: world.fenLamp.owner,
  }
  for (const person of Object.values(people)) {
    if (!(await User.findOne({ where: { personId: person.id } }))) await makeUser({ person })
  }
  if ((await Membership.count({ where: { personId: host.id } })) > 0)
    throw new Error('the host is no member of a workshop')
  const params: Record<string, string | string[]> = {
    workshop: world.workshop.slug,
    module: world.module.slug,
    run: world.run.id,
    order: world.order.id,
    parcel: parcel.id,
    batch: randomUUID(),
    problem: randomUUID(),
    paper: 'labels',
    bulk: bulk.id,
    invoice: (await makeInvoice(world.order)).id,
    part: part.id,
    file: bulk.id,
    revision: world.revision.letter,
    move: 'open',
    token: makeToken(),
    draft: makeToken(),
    nextauth: ['callback', 'email'],
  }
  return { ...world, people, params }
}

/** A session of the demo's kind, whose second factor counts as given; the cookie's value. */
export async function sessionOf(person: Person): Promise<string> {
  const user = await User.findOne({ where: { personId: person.id }, rejectOnEmpty: true })
  const token = makeToken()
  await Session.create({
    userId: user.id,
    tokenHash: hashToken(token),
    createdAt: new Date(),
    expiresAt: new Date(Date.now() + 3_600_000),
    device: 'sandbox',
  })
  return token
}
