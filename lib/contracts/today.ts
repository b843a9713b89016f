/** What may need an owner today, most pressing first. */
export const TODAY_KINDS = [
  'disputes',
  'notices_due',
  'decide_soon',
  'refunds_waiting',
  'balances_failed',
  'problems_open',
  'ready_to_lock',
  'quotes_old',
  'parts_late',
  'mails_bounced',
  'parcels_ready',
] as const
export type TodayKind = (typeof TODAY_KINDS)[number]

type OfRun = { run: { id: string; number: number; module: string; slug: string } }

/** One thing that needs the owner; `count` is what it counts: orders, parts, mails. */
export type TodayItem =
  | ({
      what: 'decide_soon'
      count: 1
      decideBy: string
      callsOffOn: string
      deposited: number
      minimum: number
    } & OfRun)
  | ({ what: 'ready_to_lock'; count: 1; deposited: number; minimum: number } & OfRun)
  | ({ what: 'notices_due'; postedBy: string; silence: Silence[] } & Counted & OfRun)
  | ({ what: 'balances_failed' | 'problems_open' | 'disputes' | 'refunds_waiting' } & Counted & OfRun)
  | ({ what: 'quotes_old' | 'parts_late' } & Counted & OfRun)
  | ({ what: 'mails_bounced' | 'parcels_ready'; run: null } & Counted)

type Counted = { count: number }

/** What the silence of the buyers of one country would do, were a notice without a new date sent today. */
export type Silence = {
  country: string
  orders: number
  worthMinor: number
  currency: string
  silenceMeans: 'wait' | 'cancel'
  answerBy: string
}
