import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Form } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { TextField } from '@/components/ui/text-field'
import { ownPath } from '@/lib/contracts/sign-in'
import { secondFactorWords as words } from '@/lib/messages/second-factor'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { setUpSecondFactor } from '@/lib/services/sign-in/set-up-second-factor'
import { SetUpSheet } from './_parts/set-up-sheet'

export const metadata: Metadata = { title: words.title }

type Props = { searchParams: Promise<{ next?: string; draft?: string }> }

export default async function SecondFactorPage({ searchParams }: Props) {
  const { next, draft } = await searchParams
  const goesOn = ownPath.parse(next) ?? paths.account
  const actor = await signedIn(paths.secondFactor(goesOn))
  const setUp = await setUpSecondFactor({ actor })
  if (!setUp.ok) notFound()
  const kept = keptForm(await getFormDraft(draft, 'second-factor'))
  const { secret, uri, recoveryCodes } = setUp.value
  return (
    <SignedFrame>
      <PageHead title={words.title} lead={secret === null ? words.giveLead : words.setUpLead} />
      <Stack>
        {secret === null ? null : <SetUpSheet secret={secret} uri={uri} recoveryCodes={recoveryCodes} />}
        <Form
          action={paths.api.secondFactor}
          contract="secondFactor"
          form={kept}
          hidden={{ next: goesOn }}
          foot={<Button>{words.go}</Button>}
        >
          <TextField
            name="code"
            label={words.code}
            hint={words.codeHint}
            autoComplete="one-time-code"
            width="short"
            form={kept}
          />
        </Form>
      </Stack>
    </SignedFrame>
  )
}
