import type { Metadata } from 'next'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Words } from '@/components/ui/columns'
import { Form } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { SiteFrame } from '@/components/ui/site-frame'
import { NumberField } from '@/components/ui/text-field'
import { signInWords as words } from '@/lib/messages/sign-in'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'

export const metadata: Metadata = { title: words.sentTitle, robots: { index: false } }

type Props = { searchParams: Promise<{ draft?: string }> }

export default async function SignInSentPage({ searchParams }: Props) {
  const kept = keptForm(await getFormDraft((await searchParams).draft, 'signin-code'))
  return (
    <SiteFrame>
      <PageHead title={words.sentTitle} lead={words.sentLead} />
      <Words>
        <p className="pb-5">{words.sentOther}</p>
      </Words>
      <Form
        action={paths.api.signInCode}
        contract="signInCode"
        form={kept}
        foot={<Button kind="secondary">{words.useCode}</Button>}
      >
        <NumberField name="code" label={words.code} autoComplete="one-time-code" form={kept} />
      </Form>
    </SiteFrame>
  )
}
