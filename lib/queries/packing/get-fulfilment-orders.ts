import 'server-only'
import type { QueueQuery } from '@/lib/contracts/packing'
import type { FulfilmentOrder } from '@/lib/contracts/papers'
import { can, type Actor } from '@/lib/core/policy/can'
import { dayIn } from '@/lib/core/time/zone'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { Module, Offer, OrderLine, Person, Revision, Run, RunOffer, Workshop } from '@/models'

/** Orders on one list: what a packer takes in an afternoon, and what a printer takes at once. */
export const PAPERS_MOST = 200

export type FulfilmentPaper = {
  workshop: string
  printedBy: string
  printedOn: string
  /** Whether the workshop's country prints on Letter. */
  usesLetter: boolean
  runs: { module: string; revision: string; run: number }[]
  orders: FulfilmentOrder[]
  /** True when the queue goes on. */
  isCut: boolean
}

export const LETTER_COUNTRIES = ['US', 'CA', 'MX', 'PH', 'CL', 'CO', 'VE']

/** What every paper names of workshop and maker. Two statements. */
export async function getPaperIssue(cmd: {
  actor: Extract<Actor, { kind: 'person' }>
  workshopId: string
  now: Date
}) {
  const workshop = await Workshop.findByPk(cmd.workshopId, { rejectOnEmpty: true })
  const person = await Person.findByPk(cmd.actor.personId, { attributes: ['name'] })
  return {
    row: workshop,
    workshop: workshop.name,
    printedBy: person?.name ?? cmd.actor.email,
    printedOn: dayIn(cmd.now, workshop.timeZone),
    usesLetter: LETTER_COUNTRIES.includes(workshop.country),
  }
}

/** The queue as the fulfilment list prints it, the first 200 parcels; null for who may not print. Five statements. */
export async function getFulfilmentOrders(cmd: {
  actor: Actor
  workshopId: string
  query?: QueueQuery
  now: Date
}): Promise<FulfilmentPaper | null> {
  const { actor, workshopId, query, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'paper:print', { workshopId })) return null
  const { items, next } = await listPackQueue({ actor, workshopId, query, limit: PAPERS_MOST })
  const { row: _row, ...issue } = await getPaperIssue({ actor, workshopId, now })
  const runs = await Run.findAll({
    where: { id: [...new Set(items.map(({ run }) => run))] },
    include: [
      { model: Module, as: 'module', attributes: ['name'] },
      { model: Revision, as: 'revision', attributes: ['letter'] },
    ],
    order: [['createdAt', 'ASC']],
  })
  const places = await placesOf(items.flatMap(({ lines }) => lines.map(({ line }) => line)))
  return {
    ...issue,
    runs: runs.map(({ module, revision, number }) => ({
      module: module?.name ?? '',
      revision: revision?.letter ?? '',
      run: number,
    })),
    orders: items.map(({ number, name, country, postedBy, lines }) => ({
      number,
      name,
      country,
      postedBy,
      note: null,
      lines: lines.map(({ module, offer, quantity, choices, line }) => ({
        place: places.get(line) ?? '',
        module,
        offer,
        quantity,
        choices,
        serials: [],
      })),
    })),
    isCut: next !== null,
  }
}

/** Where the things of lines of orders stand. */
async function placesOf(lineIds: string[]): Promise<Map<string, string>> {
  const offer = { model: Offer, as: 'offer', attributes: ['storagePlace'] }
  const lines = await OrderLine.findAll({
    where: { id: lineIds },
    attributes: ['id'],
    include: [{ model: RunOffer, as: 'runOffer', attributes: ['id'], include: [offer] }],
  })
  return new Map(lines.map(({ id, runOffer }) => [id, runOffer?.offer?.storagePlace ?? '']))
}
