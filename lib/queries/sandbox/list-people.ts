import 'server-only'
import { Membership, Person, User, Workshop } from '@/models'

export type SandboxPerson = {
  email: string
  name: string | null
  works: { role: string; workshop: string }[]
}

/** People who can be signed in as in the sandbox: staff first, then by address; at most fifty. Two statements. */
export async function listSandboxPeople(): Promise<SandboxPerson[]> {
  const people = await Person.findAll({
    include: [
      { model: User, as: 'user', required: true, attributes: ['id'] },
      { model: Membership, as: 'memberships', where: { endedAt: null }, required: false },
    ],
    order: [['emailNormal', 'ASC']],
    limit: 200,
  })
  const workshops = await Workshop.findAll({ attributes: ['id', 'name'] })
  const nameOf = new Map(workshops.map(({ id, name }) => [id, name]))
  return people
    .filter(({ emailNormal }) => emailNormal !== null)
    .map((person) => ({
      email: person.emailNormal ?? '',
      name: person.name,
      works: (person.memberships ?? []).map(({ role, workshopId }) => ({
        role,
        workshop: nameOf.get(workshopId) ?? '',
      })),
    }))
    .sort((a, b) => Number(b.works.length > 0) - Number(a.works.length > 0))
    .slice(0, 50)
}
