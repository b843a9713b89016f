import {
  type CreationOptional,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type NonAttribute,
} from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { key, moment, optional, preset, table, text } from './columns'
import type { Invitation } from './invitation'
import type { MailOutbox } from './mail-outbox'
import type { Membership } from './membership'
import type { Order } from './order'
import type { Parcel } from './parcel'
import type { SignUp } from './sign-up'
import type { User } from './user'

/** A human being known by an e-mail address: visitor, customer or staff. Personal data of people lives here. */
export class Person extends Model<InferAttributes<Person>, InferCreationAttributes<Person>> {
  /** Random id. */
  declare id: CreationOptional<string>
  /** E-mail, trimmed and in lower case: the key under which a person is found. Null once erased. */
  declare emailNormal: string | null
  /** E-mail as the person typed it last, for envelopes. Null once erased. */
  declare emailShown: string | null
  /** Name as given by the person. Null until given and once erased. */
  declare name: string | null
  /** BCP 47 tag of the language mails are written in. */
  declare locale: CreationOptional<string>
  /** When the person was first heard of (business time). */
  declare createdAt: Date
  /** When the last mail to this address bounced for good; null while mails arrive. Stops lapses. */
  declare mailBouncedAt: Date | null
  /** When personal data was blanked on request; null while the person is known. */
  declare erasedAt: Date | null

  declare user?: NonAttribute<User>
  declare memberships?: NonAttribute<Membership[]>
  declare signups?: NonAttribute<SignUp[]>
  declare invitations?: NonAttribute<Invitation[]>
  declare orders?: NonAttribute<Order[]>
  declare parcels?: NonAttribute<Parcel[]>
  declare mails?: NonAttribute<MailOutbox[]>

  facts() {
    return {
      id: this.id,
      emailNormal: this.emailNormal,
      mailBouncedAt: this.mailBouncedAt,
      erasedAt: this.erasedAt,
    }
  }
}

Person.init(
  {
    id: key(),
    emailNormal: optional(text()),
    emailShown: optional(text()),
    name: optional(text()),
    locale: preset(text(), 'en'),
    createdAt: moment(),
    mailBouncedAt: optional(moment()),
    erasedAt: optional(moment()),
  },
  table(sequelize, 'Person', 'people'),
)
