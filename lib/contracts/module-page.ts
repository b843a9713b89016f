import type { FrontPanelControl, SpecificationLine } from './front-panel'
import type { OfferKind } from './fields'
import type { Delivery, ModulePublic } from './modules'

export type PageOffer = {
  offer: OfferKind
  /** null while the price is open; of the run while one takes deposits. */
  priceMinor: number | null
  depositMinor: number | null
  /** Prices a sign-up may choose its highest from; empty unless the price is open. */
  priceListMinor: number[]
  contents: string
  cautions: string
  ageFrom: number
  choices: { question: string; answers: { label: string; surchargeMinor: number }[] }[]
}

export type PageRun = NonNullable<ModulePublic['run']> & {
  revision: string
  /** Whole days to the decide-by day; 0 on it, below 0 after. */
  daysLeft: number
  balanceWhen: 'at_lock' | 'units_passed' | 'before_packing'
  limitPerPerson: number
  /** Whether an order can be placed now, by those invited or by everyone. */
  takesOrders: boolean
  isOpenToAll: boolean
  /** Every place is taken or held: an order joins the waiting list. */
  isFull: boolean
  /** Day of the lock in the workshop's zone. */
  lockedOn: string | null
  /** Days since buyers last heard news after the lock, once there are thirty; null before. */
  silentDays: number | null
}

/** What a workshop's earlier runs came to; nothing in it is typed by hand. */
export type PublicRecord = {
  /** Days the last parcel was posted after the day first promised; below 0 when earlier. One per run. */
  daysLate: number[]
  /** Days until the last refund arrived, per run called off; null while one is still missing. */
  repaidInDays: (number | null)[]
}

export type Maker = {
  slug: string
  name: string
  legalName: string | null
  /** As on a label. */
  address: string[]
  replyTo: string | null
  phone: string | null
  taxNumber: string | null
  about: string
}

export type ModulePage = {
  workshop: {
    slug: string
    name: string
    country: string
    currency: string
    timeZone: string
    /** False while it is suspended: nothing new is taken. */
    isOpen: boolean
    pricesIncludeTax: boolean
    taxMode: 'not_registered' | 'home_rate' | 'destination_rate' | 'export_without_tax'
    taxNote: string | null
  }
  module: {
    slug: string
    name: string
    oneLine: string
    story: string
    widthHp: number
    depthMm: number
    plus12Ma: number
    minus12Ma: number
    plus5Ma: number
    controls: FrontPanelControl[]
    specification: SpecificationLine[]
    cautions: string
    videoUrl: string | null
  }
  offers: PageOffer[]
  interest: ModulePublic['interest']
  run: PageRun | null
  terms: { number: number; body: string; publishedOn: string } | null
  maker: Maker
  record: PublicRecord
  delivery: Delivery
  /** Where anything of it is posted, by code. */
  countries: string[]
}

/** A module as lists show it. */
export type ModuleCard = {
  workshop: { slug: string; name: string }
  slug: string
  name: string
  oneLine: string
  widthHp: number
  controls: FrontPanelControl[]
  run: {
    state: 'taking_deposits' | 'locked'
    deposited: number
    minimum: number
    maximum: number
    decideBy: string
    daysLeft: number
  } | null
}

export type WorkshopFront = { maker: Maker; isOpen: boolean; modules: ModuleCard[]; record: PublicRecord }
export type SiteFront = {
  modules: ModuleCard[]
  workshops: { slug: string; name: string; about: string; modules: number }[]
}
