import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { TaxMode } from '@/lib/core/orders/tax-rate'
import type { Address } from '@/lib/core/post/address'
import type { WorkshopState } from '@/lib/core/states/workshop'
import { sequelize } from '@/lib/db/sequelize'
import { flag, json, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { MailOutbox } from './mail-outbox'
import type { Membership } from './membership'
import type { Module } from './module'
import type { Order } from './order'
import type { Run } from './run'

/** A maker's business on Brimline; sells in its own name on its own payment account. */
export class Workshop extends Model<InferAttributes<Workshop>, InferCreationAttributes<Workshop>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Name in addresses of pages: small letters, digits and hyphens, 1–40 characters. */
  declare slug: string
  /** Name as shown. */
  declare name: string
  /** Where the workshop stands (states.md, workshop). */
  declare state: CreationOptional<WorkshopState>
  /** The one selling currency, ISO 4217. Fixed once an order exists. */
  declare currency: string
  /** IANA zone in which its days begin and end. */
  declare timeZone: string
  /** Where it is established and posts from, ISO 3166-1 alpha-2. */
  declare country: string
  /** BCP 47 tag for its own pages and figures. */
  declare locale: CreationOptional<string>
  /** How tax is charged: none; the home rate everywhere; the destination's rate; the home rate in the tax area and none on exports. */
  declare taxMode: CreationOptional<TaxMode>
  /** True: entered prices contain the tax. False: it is added. */
  declare pricesIncludeTax: CreationOptional<boolean>
  /** True: tax falls due when a payment arrives. False: when the order is posted. */
  declare depositsTaxed: CreationOptional<boolean>
  /** Sentence the law wants where no tax is charged; printed on papers. */
  declare taxNote: string | null
  /** Its tax or VAT number as text; null if it has none. */
  declare taxNumber: string | null
  /** Name of the person or company the buyer contracts with; needed to open. */
  declare legalName: string | null
  /** Where it can be written to; shown on public pages. Null until entered. */
  declare postalAddress: Address | null
  /** Address that answers to its mails go to; null until entered. */
  declare replyTo: string | null
  /** Telephone shown to buyers, E.164; null if none is shown. */
  declare phone: string | null
  /** Who the maker is, plain text, for the workshop's front. */
  declare about: CreationOptional<string>
  /** Connected account at the payment provider; null until connected. */
  declare providerAccountId: string | null
  /** When the provider said the account may take payments; null while it may not. */
  declare chargesEnabledAt: Date | null
  /** When payouts were set to manual at the provider; null while automatic. */
  declare payoutsManualAt: Date | null
  /** Days the provider lets deposits stay in the balance; decide-by beyond it needs a stated plan. */
  declare holdingLimitDays: CreationOptional<number>
  /** Minutes a place is held for someone paying; not under 30, the provider's least session. */
  declare holdMinutes: CreationOptional<number>
  /** Hours invited sign-ups may order before everyone, as default of new runs. */
  declare headStartHours: CreationOptional<number>
  /** Units one person may order in one run, as default of new runs. */
  declare limitPerPerson: CreationOptional<number>
  /** Days after a failed balance charge at which the order lapses. */
  declare lapseAfterDays: CreationOptional<number>
  /** True: a lapsed order's deposit is kept where local law allows. Default: returned. */
  declare lapseKeepsDeposit: CreationOptional<boolean>
  /** Days between a charge and the money being available, for the cash figures. */
  declare payoutDelayDays: CreationOptional<number>
  /** Days after delivery at which addresses are erased, invoices aside. */
  declare addressKeptDays: CreationOptional<number>
  /** Days it does not work, 'YYYY-MM-DD' each. */
  declare closedDays: CreationOptional<string[]>
  /** When it was started (business time). */
  declare createdAt: Date
  /** Who started it. */
  declare createdByPersonId: string
  /** When the host first opened it; null while pending. */
  declare openedAt: Date | null
  /** When the host suspended it; null while not suspended. */
  declare suspendedAt: Date | null

  declare modules?: NonAttribute<Module[]>
  declare memberships?: NonAttribute<Membership[]>
  declare runs?: NonAttribute<Run[]>
  declare orders?: NonAttribute<Order[]>
  declare mails?: NonAttribute<MailOutbox[]>

  facts() {
    return {
      id: this.id,
      slug: this.slug,
      state: this.state,
      currency: this.currency,
      timeZone: this.timeZone,
      country: this.country,
      taxMode: this.taxMode,
      pricesIncludeTax: this.pricesIncludeTax,
      providerAccountId: this.providerAccountId,
      chargesEnabledAt: this.chargesEnabledAt,
      payoutsManualAt: this.payoutsManualAt,
      holdingLimitDays: this.holdingLimitDays,
      holdMinutes: this.holdMinutes,
      postalAddress: this.postalAddress,
    }
  }
}

Workshop.init(
  {
    id: key(),
    slug: text(),
    name: text(),
    state: preset(text(), 'pending'),
    currency: text(),
    timeZone: text(),
    country: text(),
    locale: preset(text(), 'en'),
    taxMode: preset(text(), 'not_registered'),
    pricesIncludeTax: preset(flag(), true),
    depositsTaxed: preset(flag(), false),
    taxNote: optional(text()),
    taxNumber: optional(text()),
    legalName: optional(text()),
    postalAddress: optional(json()),
    replyTo: optional(text()),
    phone: optional(text()),
    about: preset(text(), ''),
    providerAccountId: optional(text()),
    chargesEnabledAt: optional(moment()),
    payoutsManualAt: optional(moment()),
    holdingLimitDays: preset(whole(), 90),
    holdMinutes: preset(whole(), 30),
    headStartHours: preset(whole(), 48),
    limitPerPerson: preset(whole(), 4),
    lapseAfterDays: preset(whole(), 14),
    lapseKeepsDeposit: preset(flag(), false),
    payoutDelayDays: preset(whole(), 7),
    addressKeptDays: preset(whole(), 180),
    closedDays: preset(json(), []),
    createdAt: moment(),
    createdByPersonId: ref(),
    openedAt: optional(moment()),
    suspendedAt: optional(moment()),
  },
  table(sequelize, 'Workshop', 'workshops'),
)
