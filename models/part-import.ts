import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { bytes, json, key, moment, optional, preset, ref, table, text } from './columns'
import type { OfferKind } from './words'

/** A file of parts or quotes as it was sent, until it is confirmed or a day has passed. */
export class PartImport extends Model<InferAttributes<PartImport>, InferCreationAttributes<PartImport>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The revision whose list it is for. */
  declare revisionId: string
  /** Lines of a parts list, or quotes of parts. */
  declare kind: 'lines' | 'quotes'
  /** Name of the file; empty when it was pasted. */
  declare fileName: CreationOptional<string>
  /** The bytes as they came, so that another encoding can be tried. */
  declare content: Buffer
  /** How the bytes are read; null while that is found out from them. */
  declare encoding: 'utf-8' | 'windows-1252' | 'utf-16le' | 'utf-16be' | null
  /** What separates cells; null while that is found out. */
  declare delimiter: 'comma' | 'semicolon' | 'tab' | 'pipe' | null
  /** Our heading for each column, '' for one left out; null while that is found out. */
  declare columns: string[] | null
  /** Who places a part where the file does not say, by offer. */
  declare placedBy: CreationOptional<{ [K in OfferKind]?: string }>
  /** When it was sent (business time). */
  declare createdAt: Date
  /** Who sent it. */
  declare createdByPersonId: string
}

PartImport.init(
  {
    id: key(),
    workshopId: ref(),
    revisionId: ref(),
    kind: text(),
    fileName: preset(text(), ''),
    content: bytes(),
    encoding: optional(text()),
    delimiter: optional(text()),
    columns: optional(json()),
    placedBy: preset(json(), {}),
    createdAt: moment(),
    createdByPersonId: ref(),
  },
  table(sequelize, 'PartImport', 'part_imports'),
)
