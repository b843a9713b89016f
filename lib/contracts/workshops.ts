import { z } from 'zod'
import { isCountry } from '@/lib/core/data/country'
import { isCurrency } from '@/lib/core/money/currency'
import { countryCode, email, line, slug } from './fields'

/** Names that are part of other addresses, or that a stranger could take for us. */
export const RESERVED_SLUGS = [
  ...['account', 'admin', 'api', 'bench', 'brimline', 'confirm', 'form', 'help', 'host', 'join', 'mail'],
  ...[
    'new',
    'packing',
    'privacy',
    'sandbox',
    'sent',
    'signin',
    'start',
    'support',
    'take-back',
    'terms',
    'w',
    'www',
  ],
] as const

const isReserved = (name: string) => (RESERVED_SLUGS as readonly string[]).includes(name)

export const ownSlug = slug.refine(
  (name) => !isReserved(name),
  'This address is kept for the site itself. Choose another.',
)

/** IANA names this machine knows; "Europe/Berlin". */
export const timeZone = z
  .string({ error: 'Choose a time zone.' })
  .trim()
  .refine((name) => {
    try {
      return new Intl.DateTimeFormat('en', { timeZone: name }).format(0) !== ''
    } catch {
      return false
    }
  }, 'Choose a time zone, such as Europe/Berlin.')

export const assignedCountry = countryCode.refine((code) => isCountry(code), 'Choose a country.')

/** What starting a workshop asks; the rest is entered at leisure before the host opens it. */
export const WorkshopInput = z.object({
  name: line(80, 'Enter the name of your workshop.'),
  slug: ownSlug,
  legalName: line(120, 'Enter the name of the person or company buyers contract with.'),
  country: assignedCountry,
  currency: z
    .string({ error: 'Choose a currency.' })
    .trim()
    .toUpperCase()
    .refine((code) => isCurrency(code), 'Enter a currency by its three letters, such as EUR.'),
  timeZone,
  replyTo: email,
})
export type WorkshopInput = z.infer<typeof WorkshopInput>

/** A workshop as its host sees it: who the trader is, never orders or addresses of buyers. */
export type HostWorkshop = {
  slug: string
  name: string
  state: 'pending' | 'open' | 'suspended'
  legalName: string | null
  country: string
  currency: string
  replyTo: string | null
  chargesEnabled: boolean
  createdAt: string
  runs: number
  units: number
}

/** What stands between starting a workshop and its first run, in the order in which it is quickest done. */
export const FIRST_STEPS = [
  'account',
  'details',
  'terms',
  'postage',
  'module',
  'offers',
  'revision',
  'first_unit',
  'plan',
  'packer',
  'publish',
] as const
export type FirstStep = (typeof FIRST_STEPS)[number]

/** The owner's desk: how far the workshop is, and the runs that are going. */
export type Desk = {
  workshop: {
    id: string
    slug: string
    locale: string
    name: string
    state: 'pending' | 'open' | 'suspended'
    currency: string
    chargesEnabled: boolean
  }
  steps: { key: FirstStep; done: boolean }[]
  /** The module begun first, whose page the steps lead to; null while there is none. */
  firstModule: string | null
  runs: {
    id: string
    module: string
    state: 'draft' | 'taking_deposits' | 'locked'
    minimum: number
    maximum: number
    committed: number
    decideBy: string
  }[]
}
