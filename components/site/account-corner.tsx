import { DeedForm } from '@/components/ui/form'
import { Button } from '@/components/ui/button'
import { signInWords as words } from '@/lib/messages/sign-in'
import { paths } from '@/lib/paths'

type Props = { email: string | null; next?: string }

/** Right of the word mark: who is signed in and the way out, or the way in. */
export function AccountCorner({ email, next }: Props) {
  if (email === null) return <a href={paths.signIn(next)}>{words.title}</a>
  return (
    <span className="flex flex-wrap items-baseline gap-x-3">
      <a href={paths.account} title={words.signedInAs(email)}>
        {words.account}
      </a>
      <DeedForm action={paths.api.signOut}>
        <Button kind="plain">{words.signOut}</Button>
      </DeedForm>
    </span>
  )
}
