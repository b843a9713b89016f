import type { OfferKind } from './fields'
import type { FrontPanelControl, SpecificationLine } from './front-panel'

type ModuleState = 'draft' | 'published' | 'archived'

export type ModuleListItem = {
  slug: string
  name: string
  oneLine: string
  state: ModuleState
  widthHp: number
  offers: OfferKind[]
  /** Confirmed sign-ups, and the units they ask for. */
  signUps: number
  units: number
  runs: number
}

export type OfferDesk = {
  offer: OfferKind
  priceMinor: number | null
  depositMinor: number | null
  priceListMinor: number[]
  taxClass: 'standard' | 'reduced' | 'zero'
  contents: string
  netWeightG: number | null
  packedWeightG: number | null
  lengthMm: number | null
  widthMm: number | null
  heightMm: number | null
  customsDescription: string
  customsCode: string
  customsOrigin: string | null
  storagePlace: string
  cautions: string
  ageFrom: number
  withdrawn: boolean
  /** Countries it is posted to. */
  destinations: number
}

export type RevisionDesk = {
  letter: string
  state: 'draft' | 'testing' | 'proven' | 'superseded'
  note: string
  createdAt: string
  firstGood: { at: string; how: string; by: string | null } | null
  parts: number
}

export type LessonDesk = {
  id: string
  foundOn: string
  symptom: string
  howFound: string
  cause: string
  remedy: string
  mendedIn: string | null
  waivedReason: string | null
}

export type ModuleDesk = {
  module: {
    slug: string
    name: string
    oneLine: string
    story: string
    state: ModuleState
    widthHp: number
    depthMm: number
    plus12Ma: number
    minus12Ma: number
    plus5Ma: number
    controls: FrontPanelControl[]
    specification: SpecificationLine[]
    cautions: string
    videoUrl: string | null
    hideInterestBelowTen: boolean
  }
  offers: OfferDesk[]
  revisions: RevisionDesk[]
  lessons: LessonDesk[]
  hasPlan: boolean
}

export type PartsDesk = {
  revisions: string[]
  /** The revision shown; null while there is none. */
  revision: string | null
  /** The list as it would be pasted. */
  csv: string
  lines: {
    id: string
    partId: string
    code: string
    value: string
    designators: string
    perUnit: number
    placedBy: Partial<Record<OfferKind, 'assembler' | 'maker' | 'buyer'>>
    onHand: number
    quotedOn: string | null
    stockSeenOn: string | null
    sample: 'not_needed' | 'open' | 'fits' | 'does_not_fit'
  }[]
  /** Position of the first line shown, and of the next page; null on the last. */
  from: number
  next: number | null
  /** Every line whose part wants a sample looked at, wherever it stands. */
  samples: { partId: string; code: string; sample: 'not_needed' | 'open' | 'fits' | 'does_not_fit' }[]
  findings: { code: string | null; problem: string; severity: 'error' | 'advice'; detail: string }[]
}

export type PlanDesk = {
  currency: string
  /** Offers the plan is made for; the form asks for each. */
  offers: OfferKind[]
  /** The short form as it stands, by field. */
  values: Record<string, string>
  isSaved: boolean
  /** Offers entered since the plan was saved: it must be saved again. */
  missing: OfferKind[]
  /** Parts of the newest revision that go into the costs. */
  parts: number
  /** The same number of units of each offer, costed; empty until the plan is saved. */
  trial: { units: number; costMinor: number; unpriced: string[] }[]
}
