import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, ref, table, text } from './columns'
import type { Module } from './module'

/** A question about a module and its answer on the page. */
export class Question extends Model<InferAttributes<Question>, InferCreationAttributes<Question>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The workshop that owns the row. */
  declare workshopId: string
  /** The module. */
  declare moduleId: string
  /** Who asked; null when the owner wrote it or after erasure. */
  declare personId: string | null
  /** The question. */
  declare question: string
  /** The answer; empty until given. */
  declare answer: CreationOptional<string>
  /** When it was asked (business time). */
  declare askedAt: Date
  /** When it was answered; null while it was not. */
  declare answeredAt: Date | null
  /** When it was put on the page; null while it is not. */
  declare publishedAt: Date | null

  declare module?: NonAttribute<Module>
}

Question.init(
  {
    id: key(),
    workshopId: ref(),
    moduleId: ref(),
    personId: optional(ref()),
    question: text(),
    answer: preset(text(), ''),
    askedAt: moment(),
    answeredAt: optional(moment()),
    publishedAt: optional(moment()),
  },
  table(sequelize, 'Question', 'questions'),
)
