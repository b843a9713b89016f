import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { bigWhole, json, key, moment, optional, preset, ref, table, text, whole } from './columns'
import type { FileVariant } from './json'
import type { FileKind, FileScope } from './words'

/** A stored file: picture, sound, document or paper. */
export class StoredFile extends Model<InferAttributes<StoredFile>, InferCreationAttributes<StoredFile>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** Workshop it belongs to; null if to none. */
  declare workshopId: string | null
  /** Person it belongs to; null if to none. */
  declare personId: string | null
  /** What it is. */
  declare kind: FileKind
  /** Who may read it. */
  declare ownerScope: FileScope
  /** Noun of what it belongs to ('module', 'lesson', …). */
  declare subjectType: string
  /** Its id. */
  declare subjectId: string
  /** What it is there for ('build_guide', 'front_picture', …). */
  declare role: CreationOptional<string>
  /** Order among its kind, from 0. */
  declare position: CreationOptional<number>
  /** SHA-256 of the stored bytes, hex. */
  declare sha256: string
  /** Media type found by looking, not as claimed. */
  declare mediaType: string
  /** Size in bytes. */
  declare byteCount: number
  /** Name as uploaded, cleaned. */
  declare fileName: string
  /** What a picture shows, in words. */
  declare alt: CreationOptional<string>
  /** Width of a picture, pixels. */
  declare widthPx: number | null
  /** Height of a picture, pixels. */
  declare heightPx: number | null
  /** Point that stays in sight when cut: percent from the left. */
  declare focalX: CreationOptional<number>
  /** The same: percent from the top. */
  declare focalY: CreationOptional<number>
  /** Length of a sound, milliseconds; null otherwise. */
  declare durationMs: number | null
  /** Sizes and formats made of it, each with its own sha256. */
  declare variants: CreationOptional<FileVariant[]>
  /** When it was stored (business time). */
  declare createdAt: Date
  /** Who uploaded it; null when the system made it. */
  declare createdByPersonId: string | null
  /** When its bytes were removed; null while kept. */
  declare erasedAt: Date | null
}

StoredFile.init(
  {
    id: key(),
    workshopId: optional(ref()),
    personId: optional(ref()),
    kind: text(),
    ownerScope: text(),
    subjectType: text(),
    subjectId: ref(),
    role: preset(text(), ''),
    position: preset(whole(), 0),
    sha256: text(),
    mediaType: text(),
    byteCount: bigWhole(),
    fileName: text(),
    alt: preset(text(), ''),
    widthPx: optional(whole()),
    heightPx: optional(whole()),
    focalX: preset(whole(), 50),
    focalY: preset(whole(), 50),
    durationMs: optional(whole()),
    variants: preset(json(), []),
    createdAt: moment(),
    createdByPersonId: optional(ref()),
    erasedAt: optional(moment()),
  },
  table(sequelize, 'StoredFile', 'files'),
)
