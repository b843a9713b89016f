import { z } from 'zod'
import { countriesOf } from './country-list'
import { AddressInput } from './address'
import {
  countryCode,
  email,
  line,
  minorAmount,
  optionalLine,
  paragraphs,
  slug,
  tick,
  token,
  uuid,
  wholeNumber,
} from './fields'
import { blank, rows } from './rows'

export const taxMode = z.enum(['not_registered', 'home_rate', 'destination_rate', 'export_without_tax'], {
  error: 'Choose how you charge tax.',
})

/** Who the workshop is, where it can be written to, how it charges tax, and what new runs start from. */
export const DetailsInput = z.object({
  name: line(80, 'Enter the name of your workshop.'),
  legalName: line(120, 'Enter the name of the person or company buyers contract with.'),
  replyTo: email,
  phone: optionalLine(40),
  postalAddress: AddressInput,
  about: paragraphs(5000),
  taxMode,
  pricesIncludeTax: tick,
  depositsTaxed: tick,
  taxNumber: optionalLine(40),
  taxNote: optionalLine(500),
  headStartHours: wholeNumber(0, 336),
  limitPerPerson: wholeNumber(1, 10),
  lapseAfterDays: wholeNumber(12, 60, 'Enter from 12 to 60 days; reminders go out after 3, 7 and 12.'),
})
export type DetailsInput = z.infer<typeof DetailsInput>

const grams = wholeNumber(1, 40_000, 'Enter whole grams, from 1 to 40000.')

const Service = z
  .object({
    name: line(80, 'Name the service, as buyers will read it.'),
    kind: z.enum(['letter', 'parcel'], { error: 'Choose letter or parcel.' }),
    maxGrams: grams,
    maxMm: wholeNumber(1, 3000, 'Enter the longest side in whole millimetres, from 1 to 3000.'),
    tracked: tick,
    bands: rows(z.object({ upTo: grams, priceMinor: minorAmount() }), 8),
  })
  .superRefine((service, check) => {
    if (service.bands.length === 0)
      check.addIssue({ code: 'custom', path: ['bands', 0, 'upTo'], message: 'Enter at least one price.' })
    service.bands.forEach(({ upTo }, i) => {
      const at = (message: string) => check.addIssue({ code: 'custom', path: ['bands', i, 'upTo'], message })
      if (upTo > service.maxGrams) at('This is heavier than the service takes.')
      if (service.bands.findIndex((other) => other.upTo === upTo) !== i) at('This weight stands here twice.')
    })
  })

/** A zone of the post with its services; `zone` names one to change. */
export const PostageInput = z.object({
  zone: blank(uuid),
  name: line(80, 'Name the zone.'),
  countries: z
    .string({ error: 'Name at least one country.' })
    .max(4000)
    .transform((typed, check) => {
      const read = countriesOf(typed)
      if (read.ok) return read.value
      check.addIssue({ code: 'custom', message: read.words })
      return z.NEVER
    }),
  services: rows(Service, 4, ['kind', 'tracked']).refine((list) => list.length > 0, {
    path: [0, 'name'],
    error: 'Enter at least one service.',
  }),
})
export type PostageInput = z.infer<typeof PostageInput>
export const ZoneInput = z.object({ zone: uuid })

export const TermsInput = z.object({
  body: paragraphs(100_000, 40, 'Write your terms; buyers agree to them when they order.'),
  lapseKeepsDeposit: tick,
})
export type TermsInput = z.infer<typeof TermsInput>

/** Whether an offer is posted to a country; for all modules when none is named. */
export const DestinationInput = z
  .object({
    module: blank(slug),
    country: countryCode,
    state: z.enum(['open', 'closed', 'paused'], { error: 'Choose open, closed or paused.' }),
    reason: optionalLine(300),
  })
  .refine(({ state, reason }) => state === 'open' || reason !== undefined, {
    path: ['reason'],
    error: 'Say why; buyers there read it.',
  })
export type DestinationInput = z.infer<typeof DestinationInput>

export const MemberInput = z.object({
  email,
  role: z.enum(['owner', 'bench', 'packer'], { error: 'Choose what they will do.' }),
})
export type MemberInput = z.infer<typeof MemberInput>
export const MembershipInput = z.object({ membership: uuid })
export const StaffInvitationInput = z.object({ invitation: uuid })
export const JoinInput = z.object({ token })

export type PostageZoneView = {
  id: string
  name: string
  countries: string[]
  services: {
    name: string
    kind: 'letter' | 'parcel'
    maxGrams: number
    maxMm: number
    tracked: boolean
    bands: { upTo: number; priceMinor: number }[]
  }[]
}
export type TermsView = {
  number: number
  body: string
  lapseKeepsDeposit: boolean
  publishedAt: string
}
export type MemberView = {
  id: string
  personId: string
  email: string
  name: string | null
  role: 'owner' | 'bench' | 'packer'
  since: string
}
export type StaffInvitationView = { id: string; email: string; role: MemberView['role']; validUntil: string }
export type TaxRateView = { country: string; basisPoints: number; validFrom: string; source: string }
export type SettingsView = {
  details: Omit<DetailsInput, 'postalAddress' | 'phone' | 'taxNumber' | 'taxNote'> & {
    postalAddress: Partial<DetailsInput['postalAddress']> | null
    phone: string | null
    taxNumber: string | null
    taxNote: string | null
  }
  homeRate: TaxRateView | null
  zones: PostageZoneView[]
  terms: TermsView | null
  closedDestinations: { module: string; offer: string; country: string; state: string; reason: string }[]
}
