import 'server-only'
import { literal, Op } from 'sequelize'
import { Membership, Person, Workshop } from '@/models'

export type SandboxPerson = {
  email: string
  name: string | null
  works: { role: string; workshop: string }[]
}

const SOME_BUYERS = 8

/**
 * People who can be signed in as in the sandbox: hosts and staff, then a few buyers who have ordered. Three statements.
 */
export async function listSandboxPeople(hosts: readonly string[]): Promise<SandboxPerson[]> {
  const staff = await Person.findAll({
    include: [{ model: Membership, as: 'memberships', where: { endedAt: null }, required: true }],
    order: [['emailNormal', 'ASC']],
    limit: 50,
  })
  const buyers = await Person.findAll({
    where: { id: { [Op.in]: literal('(select person_id from orders)') }, emailNormal: { [Op.ne]: null } },
    order: [['emailNormal', 'ASC']],
    limit: SOME_BUYERS,
  })
  const workshops = await Workshop.findAll({ attributes: ['id', 'name'] })
  const nameOf = new Map(workshops.map(({ id, name }) => [id, name]))
  const known = new Set(staff.map(({ id }) => id))
  return [
    ...hosts.map((email) => ({ email, name: null, works: [{ role: 'host', workshop: '' }] })),
    ...[...staff, ...buyers.filter(({ id }) => !known.has(id))].map((person) => ({
      email: person.emailNormal ?? '',
      name: person.name,
      works: (person.memberships ?? []).map(({ role, workshopId }) => ({
        role,
        workshop: nameOf.get(workshopId) ?? '',
      })),
    })),
  ]
}
