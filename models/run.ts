import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { Day } from '@/lib/core/brand'
import type { RunState } from '@/lib/core/states/run'
import { sequelize } from '@/lib/db/sequelize'
import { bigWhole, day, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { Decision } from './decision'
import type { Invitation } from './invitation'
import type { Module } from './module'
import type { Notice } from './notice'
import type { Order } from './order'
import type { Parcel } from './parcel'
import type { Plan } from './plan'
import type { Revision } from './revision'
import type { RunOffer } from './run-offer'
import type { RunUpdate } from './run-update'
import type { TermsVersion } from './terms-version'
import type { Waiver } from './waiver'
import type { BalanceWhen, CallOffCause } from './words'
import type { Workshop } from './workshop'

/** One production run of a revision, with a minimum, a maximum and a decide-by date. */
export class Run extends Model<InferAttributes<Run>, InferCreationAttributes<Run>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The module. */
  declare moduleId: string
  /** The revision that will be built. */
  declare revisionId: string
  /** Counts up from 1 within the module. */
  declare number: number
  /** Where it stands (states.md, run). */
  declare state: CreationOptional<RunState>
  /** Units under deposit at which it can go. */
  declare minimum: number
  /** Units it can take at most. */
  declare maximum: number
  /** The minimum at opening; it may only fall from there. */
  declare minimumFirst: number
  /** Units taken and held, changed under the row's lock: awaiting deposit up to posted, manual orders too. */
  declare committedUnits: CreationOptional<number>
  /** Number the next arrival in the waiting list gets. */
  declare nextQueueNo: CreationOptional<number>
  /** Units one person may order. */
  declare limitPerPerson: CreationOptional<number>
  /** Selling currency, copied from the workshop. */
  declare currency: string
  /** Last day of deciding, in the workshop's zone. */
  declare decideByOn: Day
  /** The instant that day ends there. */
  declare decideByAt: Date
  /** The day first published; it moves once, by at most 30 days. */
  declare decideByFirstOn: Day
  /** When it was moved; null while it was not. */
  declare decideByMovedAt: Date | null
  /** Hours invited sign-ups may order before everyone. */
  declare headStartHours: CreationOptional<number>
  /** When everyone may order; null before opening. */
  declare opensToAllAt: Date | null
  /** When balances fall due, as shown to buyers. */
  declare balanceWhen: BalanceWhen
  /** What happens to deposits should decide-by lie beyond the provider's limit; null if it does not. */
  declare holdingPlan: string | null
  /** Terms new orders are placed under; null before opening. */
  declare termsVersionId: string | null
  /** When it was drafted (business time). */
  declare createdAt: Date
  /** Who drafted it. */
  declare createdByPersonId: string
  /** When it began to take deposits. */
  declare openedAt: Date | null
  /** When it was locked. */
  declare lockedAt: Date | null
  /** Reason given for locking short of the minimum, told to buyers; null if it was reached. */
  declare lockReason: string | null
  /** Units to build as frozen at the lock. */
  declare plannedStarts: number | null
  /** When the balances were announced; null while they were not. */
  declare balancesAskedAt: Date | null
  /** When it was called off. */
  declare calledOffAt: Date | null
  /** Why, told to buyers. */
  declare callOffReason: string | null
  /** Whether the owner or the clock called it off. */
  declare callOffCause: CallOffCause | null
  /** When it was closed. */
  declare closedAt: Date | null
  /** When buyers last heard news of it; 30 days of silence after the lock show in public. */
  declare lastUpdateAt: Date | null

  declare module?: NonAttribute<Module>
  declare workshop?: NonAttribute<Workshop>
  declare revision?: NonAttribute<Revision>
  declare offers?: NonAttribute<RunOffer[]>
  declare orders?: NonAttribute<Order[]>
  declare invitations?: NonAttribute<Invitation[]>
  declare waivers?: NonAttribute<Waiver[]>
  declare decisions?: NonAttribute<Decision[]>
  declare updates?: NonAttribute<RunUpdate[]>
  declare notices?: NonAttribute<Notice[]>
  declare plans?: NonAttribute<Plan[]>
  declare termsVersion?: NonAttribute<TermsVersion>
  declare parcels?: NonAttribute<Parcel[]>

  facts() {
    return {
      id: this.id,
      workshopId: this.workshopId,
      moduleId: this.moduleId,
      revisionId: this.revisionId,
      state: this.state,
      minimum: this.minimum,
      maximum: this.maximum,
      committedUnits: this.committedUnits,
      limitPerPerson: this.limitPerPerson,
      currency: this.currency,
      decideByOn: this.decideByOn,
      decideByAt: this.decideByAt,
      decideByFirstOn: this.decideByFirstOn,
      decideByMovedAt: this.decideByMovedAt,
      headStartHours: this.headStartHours,
      openedAt: this.openedAt,
      opensToAllAt: this.opensToAllAt,
      balanceWhen: this.balanceWhen,
      lockedAt: this.lockedAt,
    }
  }
}

Run.init(
  {
    id: key(),
    workshopId: ref(),
    moduleId: ref(),
    revisionId: ref(),
    number: whole(),
    state: preset(text(), 'draft'),
    minimum: whole(),
    maximum: whole(),
    minimumFirst: whole(),
    committedUnits: preset(whole(), 0),
    nextQueueNo: preset(bigWhole(), 1),
    limitPerPerson: preset(whole(), 4),
    currency: text(),
    decideByOn: day(),
    decideByAt: moment(),
    decideByFirstOn: day(),
    decideByMovedAt: optional(moment()),
    headStartHours: preset(whole(), 48),
    opensToAllAt: optional(moment()),
    balanceWhen: text(),
    holdingPlan: optional(text()),
    termsVersionId: optional(ref()),
    createdAt: moment(),
    createdByPersonId: ref(),
    openedAt: optional(moment()),
    lockedAt: optional(moment()),
    lockReason: optional(text()),
    plannedStarts: optional(whole()),
    balancesAskedAt: optional(moment()),
    calledOffAt: optional(moment()),
    callOffReason: optional(text()),
    callOffCause: optional(text()),
    closedAt: optional(moment()),
    lastUpdateAt: optional(moment()),
  },
  table(sequelize, 'Run', 'runs'),
)
