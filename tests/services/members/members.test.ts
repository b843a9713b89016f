import { beforeAll, expect, test } from 'vitest'
import { refuse, ok } from '@/lib/core/result'
import { acceptMembership } from '@/lib/services/members/accept-membership'
import { inviteMember } from '@/lib/services/members/invite-member'
import { removeMember } from '@/lib/services/members/remove-member'
import { withdrawInvitation } from '@/lib/services/members/withdraw-invitation'
import { MailOutbox, Membership, StaffInvitation } from '@/models'
import { hoursAfter, NOW } from '@/tests/support/worlds/base'
import { actorOf, makePerson, makeUser } from '@/tests/support/worlds/person'
import { makeWorkshop } from '@/tests/support/worlds/workshop'

let house: Awaited<ReturnType<typeof makeWorkshop>>
let workshopId: string
const owner = () => actorOf(house.owner)

beforeAll(async () => {
  house = await makeWorkshop()
  workshopId = house.workshop.id
})

/** Invites an address and gives the token its mail carries. */
async function invite(email: string, role: 'owner' | 'bench' | 'packer', now = NOW) {
  const answer = await inviteMember({ actor: await owner(), workshopId, input: { email, role }, now })
  if (!answer.ok) throw new Error(answer.reason)
  const mail = await MailOutbox.findOne({
    where: { kind: 'staff_invitation', subjectId: answer.value.invitation },
    rejectOnEmpty: true,
  })
  const { acceptUrl } = mail.secrets as { acceptUrl: string }
  return { invitation: answer.value.invitation, token: acceptUrl.split('/').at(-1)! }
}

async function someone(email: string) {
  const { person } = await makeUser({ person: await makePerson({ emailNormal: email }) })
  return person
}

test('someone invited works for the workshop once they accept, and only they', async () => {
  const lene = await someone('lene@example.org')
  const { token } = await invite('Lene@example.org', 'packer')
  expect(token).toMatch(/^[\w-]{43}$/)
  const other = await actorOf(await someone('other@example.org'))
  expect(await acceptMembership({ actor: other, token, now: NOW })).toEqual(refuse('other_address'))
  expect(await acceptMembership({ actor: { kind: 'visitor' }, token, now: NOW })).toEqual(refuse('forbidden'))

  const answer = ok({ workshop: house.workshop.slug, role: 'packer' })
  expect(await acceptMembership({ actor: await actorOf(lene), token, now: NOW })).toEqual(answer)
  expect(await acceptMembership({ actor: await actorOf(lene), token, now: NOW })).toEqual(answer)
  expect(await acceptMembership({ actor: other, token, now: NOW })).toEqual(refuse('token_used'))
  expect((await actorOf(lene)).memberships).toEqual([{ workshopId, role: 'packer' }])
})

test('the link ends after fourteen days, when withdrawn, and when a newer one is sent', async () => {
  const jo = await actorOf(await someone('jo@example.org'))
  const first = await invite('jo@example.org', 'bench')
  const second = await invite('jo@example.org', 'bench')
  expect(await acceptMembership({ actor: jo, token: first.token, now: NOW })).toEqual(refuse('token_unknown'))
  const late = hoursAfter(NOW, 14 * 24)
  expect(await acceptMembership({ actor: jo, token: second.token, now: late })).toEqual(
    refuse('token_expired'),
  )
  const given = { actor: await owner(), workshopId, invitation: second.invitation, now: NOW }
  expect((await withdrawInvitation(given)).ok).toBe(true)
  expect((await withdrawInvitation(given)).ok).toBe(true)
  expect(await acceptMembership({ actor: jo, token: second.token, now: NOW })).toEqual(
    refuse('token_unknown'),
  )
  expect(await acceptMembership({ actor: jo, token: 'x'.repeat(43), now: NOW })).toEqual(
    refuse('token_unknown'),
  )
  expect(await StaffInvitation.count({ where: { emailNormal: 'jo@example.org' } })).toBe(2)
})

test('one address is written to five times an hour at most', async () => {
  for (let i = 0; i < 5; i += 1) await invite('often@example.org', 'bench')
  const input = { email: 'often@example.org', role: 'bench' as const }
  const sixth = await inviteMember({ actor: await owner(), workshopId, input, now: NOW })
  expect(sixth).toMatchObject({ reason: 'invalid', errors: { email: expect.any(String) } })
  await invite('often@example.org', 'bench', hoursAfter(NOW, 1.1))
})

test('a member who was removed is gone at once and may come back in another role', async () => {
  const kim = await someone('kim@example.org')
  const { token } = await invite('kim@example.org', 'bench')
  await acceptMembership({ actor: await actorOf(kim), token, now: NOW })
  const row = await Membership.findOne({ where: { workshopId, personId: kim.id }, rejectOnEmpty: true })
  const given = { actor: await owner(), workshopId, membership: row.id, now: NOW }
  expect(await removeMember(given)).toEqual(ok({ membership: row.id }))
  expect(await removeMember(given)).toEqual(ok({ membership: row.id }))
  expect((await actorOf(kim)).memberships).toEqual([])
  const back = await invite('kim@example.org', 'packer')
  await acceptMembership({ actor: await actorOf(kim), token: back.token, now: NOW })
  expect((await actorOf(kim)).memberships).toEqual([{ workshopId, role: 'packer' }])
  const same = { email: 'kim@example.org', role: 'packer' as const }
  expect(await inviteMember({ actor: await owner(), workshopId, input: same, now: NOW })).toEqual(
    refuse('already_member'),
  )
})

test('the last owner stays, also when two owners remove each other at once', async () => {
  const mine = await Membership.findOne({
    where: { workshopId, personId: house.owner.id },
    rejectOnEmpty: true,
  })
  expect(await removeMember({ actor: await owner(), workshopId, membership: mine.id, now: NOW })).toEqual(
    refuse('last_owner'),
  )
  const { token: down } = await invite(house.owner.emailNormal!, 'packer')
  expect(await acceptMembership({ actor: await owner(), token: down, now: NOW })).toEqual(
    refuse('last_owner'),
  )

  const second = await someone('second@example.org')
  const { token } = await invite('second@example.org', 'owner')
  await acceptMembership({ actor: await actorOf(second), token, now: NOW })
  const theirs = await Membership.findOne({ where: { workshopId, personId: second.id }, rejectOnEmpty: true })
  const [a, b] = [await owner(), await actorOf(second)]
  const answers = await Promise.all([
    removeMember({ actor: a, workshopId, membership: theirs.id, now: NOW }),
    removeMember({ actor: b, workshopId, membership: mine.id, now: NOW }),
  ])
  expect(answers.filter(({ ok: done }) => done)).toHaveLength(1)
  expect(await Membership.count({ where: { workshopId, role: 'owner', endedAt: null } })).toBe(1)
})

test('a foreign workshop can neither remove nor withdraw nor invite', async () => {
  const other = await makeWorkshop()
  const actor = await actorOf(other.owner)
  const { invitation } = await invite('nobody@example.org', 'bench')
  const member = await Membership.findOne({ where: { workshopId }, rejectOnEmpty: true })
  const theirs = { actor, workshopId: other.workshop.id, now: NOW }
  expect(await removeMember({ ...theirs, membership: member.id })).toEqual(refuse('not_found'))
  expect(await withdrawInvitation({ ...theirs, invitation })).toEqual(refuse('not_found'))
  const input = { email: 'x@example.org', role: 'owner' as const }
  expect(await inviteMember({ actor, workshopId, input, now: NOW })).toEqual(refuse('forbidden'))
})
