import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Stack } from '@/components/ui/columns'
import { Form } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import { TextField } from '@/components/ui/text-field'
import { businessNow } from '@/lib/http/business-now'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listMembers } from '@/lib/queries/members/list-members'
import { SettingsHead } from '../_parts/settings-head'
import { InvitationsTable, MembersTable } from './_parts/people-tables'

export const metadata: Metadata = { title: words.pages.members }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function MembersPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { draft, saved } = await searchParams
  const { actor, workshop } = await deskOf(slug, 'member:list', paths.adminSettingsPage(slug, 'members'))
  const people = await listMembers({ actor, workshopId: workshop.id, now: await businessNow() })
  if (!people) notFound()
  const form = keptForm(await getFormDraft(draft, 'member'))
  return (
    <>
      <SettingsHead slug={slug} page="members" lead={words.membersLead} />
      <Stack>
        <OutcomeNotice form="settings-deed" draft={draft} saved={saved} />
        <MembersTable slug={slug} members={people.members} zone={workshop.timeZone} />
        <InvitationsTable slug={slug} invitations={people.invitations} zone={workshop.timeZone} />
        <Sheet title={words.inviteTitle}>
          <Form
            action={paths.api.adminSettings(slug, 'members')}
            form={form}
            foot={<Button>{words.invite}</Button>}
          >
            <TextField name="email" type="email" label={words.inviteEmail} form={form} />
            <ChoiceField
              name="role"
              label={words.role}
              form={form}
              choices={Object.entries(words.roles).map(([value, label]) => ({ value, label }))}
            />
          </Form>
        </Sheet>
      </Stack>
    </>
  )
}
