import type { CreationAttributes } from 'sequelize'
import type { Actor } from '@/lib/core/policy/can'
import type { Role } from '@/lib/core/policy/audience'
import { Membership, Person, User } from '@/models'
import { NOW, serial } from './base'

/** Someone known by an e-mail address; signed in before unless said otherwise by making a `Person` alone. */
export async function makePerson(over: Partial<CreationAttributes<Person>> = {}) {
  const number = serial()
  const emailNormal = over.emailNormal ?? `person-${number}@example.org`
  return Person.create({
    name: `Person ${number}`,
    createdAt: NOW,
    emailShown: emailNormal,
    ...over,
    emailNormal,
  })
}

/** A person with a user, and a membership where a workshop is named. */
export async function makeUser(given: { person?: Person; workshopId?: string; role?: Role } = {}) {
  const person = given.person ?? (await makePerson())
  const user = await User.create({ personId: person.id, createdAt: NOW, emailVerifiedAt: NOW })
  const membership = given.workshopId
    ? await Membership.create({
        workshopId: given.workshopId,
        personId: person.id,
        role: given.role ?? 'owner',
        createdAt: NOW,
      })
    : null
  return { person, user, membership }
}

/** The person as a service sees them. The second factor counts as given at `secondFactorAt`, by default at NOW. */
export async function actorOf(
  person: Person,
  given: { host?: boolean; secondFactorAt?: Date | null } = {},
): Promise<Extract<Actor, { kind: 'person' }>> {
  const memberships = await Membership.findAll({ where: { personId: person.id, endedAt: null } })
  return {
    kind: 'person',
    personId: person.id,
    email: person.emailNormal ?? '',
    memberships: memberships.map(({ workshopId, role }) => ({ workshopId, role })),
    host: given.host ?? false,
    secondFactorAt: given.secondFactorAt === undefined ? NOW : given.secondFactorAt,
  }
}
