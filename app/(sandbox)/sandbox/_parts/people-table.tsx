import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Table } from '@/components/ui/table'
import { sandboxWords } from '@/lib/messages/sandbox'
import type { SandboxPerson } from '@/lib/queries/sandbox/list-people'

const words = sandboxWords.signIn

/** One press signs in as a person of the demo. */
export function PeopleTable({ people }: { people: readonly SandboxPerson[] }) {
  return (
    <Table
      caption={words.people}
      rows={people}
      rowKey={({ email }) => email}
      empty={words.nobody}
      columns={[
        { key: 'email', heading: words.email, cell: ({ email }) => email },
        { key: 'name', heading: words.name, cell: ({ name }) => name ?? '' },
        { key: 'works', heading: words.works, cell: worksOf },
      ]}
      actions={({ email }) => (
        <DeedForm action="/sandbox/sign-in" hidden={{ email }}>
          <Button kind="secondary">
            {words.button} <span className="sr-only">{email}</span>
          </Button>
        </DeedForm>
      )}
    />
  )
}

const worksOf = ({ works }: SandboxPerson) =>
  works.map(({ role, workshop }) => [role, workshop].filter(Boolean).join(', ')).join('; ') || words.noWork
