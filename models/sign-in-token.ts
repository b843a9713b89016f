import { type CreationOptional, type InferAttributes, type InferCreationAttributes, Model } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, table, text, whole } from './columns'

/** A link mailed for signing in: hashed, single use (consumed by delete … returning), ten minutes. */
export class SignInToken extends Model<InferAttributes<SignInToken>, InferCreationAttributes<SignInToken>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** The address the link was mailed to, normalised. */
  declare emailNormal: string
  /** SHA-256 of the token in the link, hex. */
  declare tokenHash: string
  /** SHA-256 of the cookie of the browser that asked, hex; another browser is shown a short code. */
  declare askedByHash: string | null
  /** SHA-256 of the short code to type in the asking browser, hex; null until one was shown. */
  declare codeHash: string | null
  /** Wrong codes typed so far. */
  declare codeTries: CreationOptional<number>
  /** Path to continue at after signing in; a path of ours, never a foreign address. */
  declare returnTo: string | null
  /** When it was asked for. */
  declare createdAt: Date
  /** When it stops working. */
  declare expiresAt: Date
}

SignInToken.init(
  {
    id: key(),
    emailNormal: text(),
    tokenHash: text(),
    askedByHash: optional(text()),
    codeHash: optional(text()),
    codeTries: preset(whole(), 0),
    returnTo: optional(text()),
    createdAt: moment(),
    expiresAt: moment(),
  },
  table(sequelize, 'SignInToken', 'sign_in_tokens'),
)
