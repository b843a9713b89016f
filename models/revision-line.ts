import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { json, key, optional, preset, ref, table, text, whole } from './columns'
import type { PlacedByOffer } from './json'
import type { Part } from './part'
import type { Revision } from './revision'

/** One line of a revision's parts list. */
export class RevisionLine extends Model<
  InferAttributes<RevisionLine>,
  InferCreationAttributes<RevisionLine>
> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The revision. */
  declare revisionId: string
  /** The part. */
  declare partId: string
  /** Order in the list, from 0. */
  declare position: number
  /** Designators as written ("R1-R4, R7"). */
  declare designators: CreationOptional<string>
  /** Pieces of it in one unit. */
  declare perUnit: number
  /** Who places it, per offer that needs it: assembler, maker or buyer; an offer left out does not need it. */
  declare placedBy: PlacedByOffer
  /** The answer it is needed for; null if always. */
  declare choiceAnswerId: string | null
  /** Extra share to buy, hundredths of a percent. */
  declare attritionBasisPoints: CreationOptional<number>
  /** Extra pieces to buy at least. */
  declare attritionAtLeast: CreationOptional<number>
  /** Supply pins of an integrated circuit, for the check of bypass capacitors. */
  declare supplyPins: CreationOptional<number>
  /** Remark. */
  declare note: CreationOptional<string>

  declare revision?: NonAttribute<Revision>
  declare part?: NonAttribute<Part>
}

RevisionLine.init(
  {
    id: key(),
    workshopId: ref(),
    revisionId: ref(),
    partId: ref(),
    position: whole(),
    designators: preset(text(), ''),
    perUnit: whole(),
    placedBy: json(),
    choiceAnswerId: optional(ref()),
    attritionBasisPoints: preset(whole(), 0),
    attritionAtLeast: preset(whole(), 0),
    supplyPins: preset(whole(), 0),
    note: preset(text(), ''),
  },
  table(sequelize, 'RevisionLine', 'revision_lines'),
)
