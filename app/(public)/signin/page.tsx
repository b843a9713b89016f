import type { Metadata } from 'next'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { SiteFrame } from '@/components/ui/site-frame'
import { TextField } from '@/components/ui/text-field'
import { ownPath } from '@/lib/contracts/sign-in'
import { signInWords as words } from '@/lib/messages/sign-in'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'

export const metadata: Metadata = { title: words.title, robots: { index: false } }

type Props = { searchParams: Promise<{ next?: string; draft?: string }> }

export default async function SignInPage({ searchParams }: Props) {
  const { next, draft } = await searchParams
  const kept = keptForm(await getFormDraft(draft, 'signin'))
  const goesOn = ownPath.parse(next) ?? (kept?.values?.next as string | undefined)
  return (
    <SiteFrame>
      <PageHead title={words.title} lead={words.lead} />
      <Form
        action={paths.api.signIn}
        contract="signIn"
        form={kept}
        hidden={goesOn ? { next: goesOn } : {}}
        className="max-w-md"
        foot={<Button>{words.send}</Button>}
      >
        <TextField name="email" type="email" label={words.email} autoComplete="email" form={kept} />
      </Form>
    </SiteFrame>
  )
}
