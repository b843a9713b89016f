import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { ModuleState } from '@/lib/core/states/module'
import { sequelize } from '@/lib/db/sequelize'
import { flag, json, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { FrontPanelControl, SpecificationLine } from './json'
import type { Lesson } from './lesson'
import type { Offer } from './offer'
import type { Question } from './question'
import type { Revision } from './revision'
import type { Run } from './run'
import type { SignUp } from './sign-up'
import type { Workshop } from './workshop'

/** A design sold under one name. */
export class Module extends Model<InferAttributes<Module>, InferCreationAttributes<Module>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** Name in addresses, unique within the workshop. */
  declare slug: string
  /** Name as shown. */
  declare name: string
  /** What it is, in one line. */
  declare oneLine: CreationOptional<string>
  /** What it does and why, plain text. */
  declare story: CreationOptional<string>
  /** Where it stands (states.md, module). */
  declare state: CreationOptional<ModuleState>
  /** Width in HP (5.08 mm each). */
  declare widthHp: number
  /** Depth behind the front panel with the power cable plugged in, millimetres. */
  declare depthMm: number
  /** Current from the +12 V rail, milliamperes. */
  declare plus12Ma: CreationOptional<number>
  /** Current from the −12 V rail, milliamperes. */
  declare minus12Ma: CreationOptional<number>
  /** Current from the +5 V rail, milliamperes. */
  declare plus5Ma: CreationOptional<number>
  /** What sits on the front panel and where, for the drawing; millimetres from its top left corner. */
  declare controls: CreationOptional<FrontPanelControl[]>
  /** Lines of the specification, each a name and a value. */
  declare specification: CreationOptional<SpecificationLine[]>
  /** What a buyer must know before building or using it. */
  declare cautions: CreationOptional<string>
  /** Address of a video, shown as a still with a link; null if none. */
  declare videoUrl: string | null
  /** True: the public page hides the count of sign-ups while it is under ten. */
  declare hideInterestBelowTen: CreationOptional<boolean>
  /** When it was entered (business time). */
  declare createdAt: Date
  /** When it was first published; null while it never was. */
  declare publishedAt: Date | null
  /** When it was archived; null unless archived. */
  declare archivedAt: Date | null

  declare workshop?: NonAttribute<Workshop>
  declare revisions?: NonAttribute<Revision[]>
  declare offers?: NonAttribute<Offer[]>
  declare runs?: NonAttribute<Run[]>
  declare lessons?: NonAttribute<Lesson[]>
  declare signups?: NonAttribute<SignUp[]>
  declare questions?: NonAttribute<Question[]>

  facts() {
    return {
      id: this.id,
      workshopId: this.workshopId,
      slug: this.slug,
      name: this.name,
      state: this.state,
      widthHp: this.widthHp,
      depthMm: this.depthMm,
    }
  }
}

Module.init(
  {
    id: key(),
    workshopId: ref(),
    slug: text(),
    name: text(),
    oneLine: preset(text(), ''),
    story: preset(text(), ''),
    state: preset(text(), 'draft'),
    widthHp: whole(),
    depthMm: whole(),
    plus12Ma: preset(whole(), 0),
    minus12Ma: preset(whole(), 0),
    plus5Ma: preset(whole(), 0),
    controls: preset(json(), []),
    specification: preset(json(), []),
    cautions: preset(text(), ''),
    videoUrl: optional(text()),
    hideInterestBelowTen: preset(flag(), false),
    createdAt: moment(),
    publishedAt: optional(moment()),
    archivedAt: optional(moment()),
  },
  table(sequelize, 'Module', 'modules'),
)
