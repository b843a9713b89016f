import 'server-only'
import type { Transaction } from 'sequelize'
import { Person } from '@/models'

/** An address in the form under which a person is found. */
export const normalEmail = (email: string): string => email.trim().toLowerCase()

/**
 * The person of an e-mail address, added when not known yet. An address belongs to one person, whatever its case.
 * Locks: nothing; two at once meet in the unique index. Writes: at most one person. Repeat: safe.
 */
export async function findOrAddPerson(tx: Transaction, email: string, now: Date): Promise<Person> {
  const emailNormal = normalEmail(email)
  const [person] = await Person.findOrCreate({
    where: { emailNormal },
    defaults: {
      emailNormal,
      emailShown: email.trim(),
      name: null,
      createdAt: now,
      mailBouncedAt: null,
      erasedAt: null,
    },
    transaction: tx,
  })
  return person
}
