import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import type { RevisionState } from '@/lib/core/states/revision'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { Module } from './module'
import type { RevisionLine } from './revision-line'
import type { Run } from './run'
import type { Unit } from './unit'

/** One lettered version of a module's electronics. */
export class Revision extends Model<InferAttributes<Revision>, InferCreationAttributes<Revision>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The module. */
  declare moduleId: string
  /** A, B, …, Z, AA; unique within the module. */
  declare letter: string
  /** Where it stands (states.md, revision). */
  declare state: CreationOptional<RevisionState>
  /** What it changes, in the maker's words. */
  declare note: CreationOptional<string>
  /** Width of the board, millimetres; null if not entered. */
  declare boardWidthMm: number | null
  /** Height of the board, millimetres; null if not entered. */
  declare boardHeightMm: number | null
  /** When it was begun (business time). */
  declare createdAt: Date
  /** When a unit of it first passed every step of its test plan; null while none has. */
  declare firstGoodAt: Date | null
  /** Who saw it pass. */
  declare firstGoodByPersonId: string | null
  /** How it was established. */
  declare firstGoodHow: string | null
  /** A picture of it. */
  declare firstGoodFileId: string | null

  declare module?: NonAttribute<Module>
  declare runs?: NonAttribute<Run[]>
  declare lines?: NonAttribute<RevisionLine[]>
  declare units?: NonAttribute<Unit[]>

  facts() {
    return {
      id: this.id,
      moduleId: this.moduleId,
      letter: this.letter,
      state: this.state,
      firstGoodAt: this.firstGoodAt,
    }
  }
}

Revision.init(
  {
    id: key(),
    workshopId: ref(),
    moduleId: ref(),
    letter: text(),
    state: preset(text(), 'draft'),
    note: preset(text(), ''),
    boardWidthMm: optional(whole()),
    boardHeightMm: optional(whole()),
    createdAt: moment(),
    firstGoodAt: optional(moment()),
    firstGoodByPersonId: optional(ref()),
    firstGoodHow: optional(text()),
    firstGoodFileId: optional(ref()),
  },
  table(sequelize, 'Revision', 'revisions'),
)
