import { DayText } from '@/components/format/day-text'
import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Table } from '@/components/ui/table'
import type { MemberView, StaffInvitationView } from '@/lib/contracts/settings'
import { dayIn } from '@/lib/core/time/zone'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'

type Members = { slug: string; members: MemberView[]; zone: string }

/** Who works for the workshop. */
export function MembersTable({ slug, members, zone }: Members) {
  return (
    <Table
      caption={words.members}
      rows={members}
      rowKey={(row) => row.id}
      empty={words.noInvitation}
      columns={[
        {
          key: 'person',
          heading: words.person,
          cell: (row) => (row.name ? `${row.name}, ${row.email}` : row.email),
        },
        { key: 'role', heading: words.role, cell: (row) => words.roles[row.role] },
        {
          key: 'since',
          heading: words.since,
          cell: (row) => <DayText day={dayIn(new Date(row.since), zone)} />,
        },
      ]}
      actions={(row) => (
        <DeedForm
          action={paths.api.adminSettingsDeed(slug, 'members/remove')}
          hidden={{ membership: row.id }}
        >
          <Button kind="plain">
            {words.remove} <span className="sr-only">{row.email}</span>
          </Button>
        </DeedForm>
      )}
    />
  )
}

type Invitations = { slug: string; invitations: StaffInvitationView[]; zone: string }

/** Who has been asked and has not answered. */
export function InvitationsTable({ slug, invitations, zone }: Invitations) {
  return (
    <Table
      caption={words.open}
      rows={invitations}
      rowKey={(row) => row.id}
      empty={words.noInvitation}
      columns={[
        { key: 'person', heading: words.person, cell: (row) => row.email },
        { key: 'role', heading: words.role, cell: (row) => words.roles[row.role] },
        {
          key: 'until',
          heading: words.validUntil,
          cell: (row) => <DayText day={dayIn(new Date(row.validUntil), zone)} />,
        },
      ]}
      actions={(row) => (
        <DeedForm
          action={paths.api.adminSettingsDeed(slug, 'members/withdraw')}
          hidden={{ invitation: row.id }}
        >
          <Button kind="plain">
            {words.withdraw} <span className="sr-only">{row.email}</span>
          </Button>
        </DeedForm>
      )}
    />
  )
}
