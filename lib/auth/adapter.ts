import 'server-only'
import type { Adapter, AdapterAccount, AdapterUser } from 'next-auth/adapters'
import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import { clock } from '@/lib/gateways/clock'
import { Person, Session, User } from '@/models'
import { hashToken } from '@/lib/config/secrets'

/**
 * next-auth on our own tables. Ours because a mailed link must work once even when two requests use it at the same
 * instant (one `delete … returning`), addresses are compared without regard to case, and a session's token is stored
 * as its hash only.
 */
export const adapter: Adapter = {
  async createUser(user: Omit<AdapterUser, 'id'>) {
    const emailNormal = user.email.trim().toLowerCase()
    const now = await clock.now()
    const [person] = await Person.findOrCreate({
      where: { emailNormal },
      defaults: {
        emailNormal,
        emailShown: user.email.trim(),
        name: null,
        createdAt: now,
        mailBouncedAt: null,
        erasedAt: null,
      },
    })
    const [row] = await User.findOrCreate({
      where: { personId: person.id },
      defaults: {
        personId: person.id,
        createdAt: now,
        emailVerifiedAt: now,
        totpSecretEncrypted: null,
        totpConfirmedAt: null,
        totpLastStep: null,
      },
    })
    return asUser(row, emailNormal)
  },
  async getUser(id) {
    const row = await User.findByPk(id, { include: [{ model: Person, as: 'person' }] })
    return row?.person?.emailNormal ? asUser(row, row.person.emailNormal) : null
  },
  async getUserByEmail(email) {
    const emailNormal = email.trim().toLowerCase()
    const row = await User.findOne({
      include: [{ model: Person, as: 'person', required: true, where: { emailNormal } }],
    })
    return row ? asUser(row, emailNormal) : null
  },
  async getUserByAccount() {
    return null
  },
  async updateUser(user) {
    const row = await User.findByPk(user.id, {
      include: [{ model: Person, as: 'person' }],
      rejectOnEmpty: true,
    })
    if (user.emailVerified) await row.update({ emailVerifiedAt: user.emailVerified })
    return asUser(row, row.person!.emailNormal!)
  },
  async linkAccount(account: AdapterAccount) {
    return account
  },
  async createSession({ sessionToken, userId, expires }) {
    await Session.create({
      userId,
      tokenHash: hashToken(sessionToken),
      createdAt: await clock.now(),
      expiresAt: expires,
      lastSeenAt: null,
      secondFactorAt: null,
      device: null,
    })
    return { sessionToken, userId, expires }
  },
  async getSessionAndUser(sessionToken) {
    const row = await Session.findOne({
      where: { tokenHash: hashToken(sessionToken) },
      include: [{ model: User, as: 'user', include: [{ model: Person, as: 'person' }] }],
    })
    const email = row?.user?.person?.emailNormal
    if (!row?.user || !email) return null
    return {
      session: { sessionToken, userId: row.userId, expires: row.expiresAt },
      user: asUser(row.user, email),
    }
  },
  async updateSession({ sessionToken, expires }) {
    const row = await Session.findOne({ where: { tokenHash: hashToken(sessionToken) } })
    if (!row) return null
    if (expires) await row.update({ expiresAt: expires })
    return { sessionToken, userId: row.userId, expires: row.expiresAt }
  },
  async deleteSession(sessionToken) {
    await Session.destroy({ where: { tokenHash: hashToken(sessionToken) } })
  },
  async createVerificationToken() {
    throw new Error('Links are made by request-sign-in-link, together with their mail.')
  },
  /** The token arrives hashed. Whoever deletes the row has used it; a second request finds nothing. */
  async useVerificationToken({ identifier, token }) {
    const rows = await sequelize.query<{ expires_at: Date }>(
      'delete from sign_in_tokens where token_hash = :token and email_normal = :identifier returning expires_at',
      { replacements: { token, identifier: identifier.toLowerCase() }, type: QueryTypes.SELECT },
    )
    return rows[0] ? { identifier, token, expires: rows[0].expires_at } : null
  },
}

function asUser(row: User, email: string): AdapterUser {
  return { id: row.id, email, emailVerified: row.emailVerifiedAt }
}
