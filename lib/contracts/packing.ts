import { z } from 'zod'
import { countryCode, line, type OfferKind, offerKind, optionalLine, tick, uuid, wholeNumber } from './fields'

/** One line of an order as a packer sees it: what it is, never what it cost. */
export type PackLine = {
  line: string
  module: string
  offer: OfferKind
  quantity: number
  /** Answers as given, such as `Front panel finish: sand`. */
  choices: string[]
}

export type QueueItem = {
  order: string
  number: string
  country: string
  name: string
  postedBy: string
  lines: PackLine[]
  parcel: string
}

const unlessEmpty = <T extends z.ZodType>(field: T) =>
  z.preprocess((typed) => (typed === '' ? undefined : typed), field.optional())

/** What narrows the queue; `after` is the `next` of the page before. */
export const QueueQuery = z.object({
  offer: unlessEmpty(offerKind),
  country: unlessEmpty(countryCode),
  /** An answer as given: `Front panel finish: sand`. */
  choice: unlessEmpty(line(200)),
  /** The service that was quoted. */
  service: unlessEmpty(line(80)),
  /** Orders of the same contents, as the list of them names them. */
  group: unlessEmpty(z.string().regex(/^[0-9a-f]{32}$/, 'Choose the contents from the list.')),
  batch: unlessEmpty(uuid),
  after: unlessEmpty(
    z.string().regex(/^\d{4}-\d\d-\d\d_\d{1,9}_[0-9a-f-]{36}$/, 'Start again from the first page.'),
  ),
})
export type QueueQuery = z.infer<typeof QueueQuery>

const millimetres = z.preprocess(
  (typed) => (typed === '' ? undefined : typed),
  wholeNumber(1, 3000).optional(),
)

export const PackInput = z.object({
  lines: z
    .array(
      z.object({
        line: uuid,
        quantity: wholeNumber(1, 100),
        serials: z.array(line(60)).max(100).optional(),
      }),
      { error: 'Tick the lines that are in the parcel.' },
    )
    .min(1, 'Tick the lines that are in the parcel.'),
  grams: wholeNumber(1, 40_000, 'Enter the weight in whole grams, from 1 to 40000.'),
  lengthMm: millimetres,
  widthMm: millimetres,
  heightMm: millimetres,
  weightConfirmed: tick.optional(),
})
export type PackInput = z.infer<typeof PackInput>

export const HandOverInput = z.object({
  service: line(60, 'Choose the service.'),
  tracking: optionalLine(40),
})
export type HandOverInput = z.infer<typeof HandOverInput>

/** What the queue's page says beside the list. */
export type PackSummary = {
  /** Parcels that can be packed now, whatever the filter. */
  toPack: number
  packed: number
  countries: string[]
  /** Answers given in the queue, and services quoted. */
  choices: string[]
  services: string[]
  /** Orders of each run under way, and how many of them are posted. */
  progress: { run: string; module: string; number: number; posted: number; total: number }[]
}

/** Orders of the same contents that wait in the queue. */
export type PackGroup = { group: string; count: number; lines: PackLine[] }

/** A batch on the queue's page: who packs it and how far it is. */
export type BatchRow = {
  batch: string
  name: string
  packer: string
  isMine: boolean
  total: number
  packed: number
  posted: number
  closedAt: string | null
}

/** What a packer takes from the queue at once; the filter of the queue goes along. */
export const TakeBatchInput = QueueQuery.pick({
  offer: true,
  country: true,
  choice: true,
  service: true,
  group: true,
}).extend({
  most: wholeNumber(1, 200, 'Enter how many orders, from 1 to 200.'),
  /** Who packs it; whoever takes it unless said. */
  packer: unlessEmpty(uuid),
})
export type TakeBatchInput = z.infer<typeof TakeBatchInput>

export const HoldInput = z.object({ reason: line(300, 'Say why it waits, for whoever packs next.') })

export type StopReason = 'order_disputed' | 'destination_paused' | 'on_hold' | 'no_address' | 'not_yet'

/** A paid order that is not in the queue, and why. */
export type StoppedOrder = { order: string; number: string; country: string; reason: StopReason }

/** A parcel that has left the queue: packed, or handed over. */
export type PackedParcel = {
  parcel: string
  number: number
  orderNumber: string
  name: string
  country: string
  grams: number
  service: string | null
  tracking: string | null
  at: string
}

type ParcelState = 'open' | 'packed' | 'handed_over' | 'delivered' | 'lost' | 'returned' | 'discarded'

/** One parcel as its page shows it: what is on it and in it, and nothing else of the order. */
export type ParcelPage = {
  parcel: string
  number: number
  state: ParcelState
  order: string
  orderNumber: string
  nth: number
  of: number
  /** Why it must not go out; null when it may. */
  stop: string | null
  onHoldReason: string | null
  country: string
  to: string[]
  toOwnScript: string[] | null
  lines: (PackLine & { serials: string[]; hasUnits: boolean })[]
  expectedGrams: number | null
  toleranceGrams: number | null
  noticesLightest: boolean
  grams: number | null
  sizeMm: [number, number, number] | null
  services: { name: string; maxGrams: number; tracked: boolean }[]
  quotedService: string | null
  service: string | null
  tracking: string | null
  trackingKind: 's10' | 'other' | null
  handedOverAt: string | null
  /** Last day to claim a loss from the post; null if it cannot be. */
  claimByOn: string | null
  timeZone: string
  /** Who else packs it, in an open batch of their own; null when anybody, or the reader, may. */
  otherPacker: string | null
  batch: { id: string; name: string } | null
}

export const PAPER_KINDS = ['labels', 'customs', 'invoices', 'returns', 'bags', 'hand-over'] as const
export type PaperKind = (typeof PAPER_KINDS)[number]
export const paperKind = z.enum(PAPER_KINDS)
export const SHEET_SIZES = ['A4', 'Letter'] as const
export const LABEL_SIZES = ['A6', '100x150', '4x6', 'roll62'] as const

/** Papers of parcels: of one parcel, of a batch, or of the queue as it is filtered. */
export const ParcelPaperQuery = QueueQuery.extend({
  parcel: unlessEmpty(uuid),
  size: unlessEmpty(z.enum([...SHEET_SIZES, ...LABEL_SIZES], { error: 'Choose one of the sizes of paper.' })),
})
export type ParcelPaperQuery = z.infer<typeof ParcelPaperQuery>

/** Which papers are wanted; sizes as in the printer. */
export const PaperQuery = QueueQuery.extend({
  size: unlessEmpty(z.enum(['A4', 'Letter'], { error: 'Choose A4 or Letter.' })),
})
export type PaperQuery = z.infer<typeof PaperQuery>
