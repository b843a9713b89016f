import type { Metadata } from 'next'
import { notFound, redirect } from 'next/navigation'
import { keptForm } from '@/components/forms/kept-form'
import { SignUpForm } from '@/components/module/sign-up-form'
import { PublicFrame } from '@/components/site/public-frame'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { signUpWords as words } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { loadModule } from '../../_parts/load-module'

export const metadata: Metadata = { title: words.title, robots: { index: false } }

type Props = { params: Promise<{ workshop: string; module: string; draft: string }> }

/** The form once more, with what was typed and what needs changing; gone after 15 minutes. */
export default async function SignUpDraftPage({ params }: Props) {
  const { workshop, module, draft } = await params
  const page = await loadModule(workshop, module)
  if (!page) notFound()
  const form = keptForm(await getFormDraft(draft, 'signup'))
  const here = paths.module(workshop, module)
  if (!form || !page.workshop.isOpen) redirect(`${here}#interest`)
  return (
    <PublicFrame>
      <PageHead
        trail={[
          { href: paths.workshop(workshop), label: page.workshop.name },
          { href: here, label: page.module.name },
        ]}
        title={words.resumedTitle(page.module.name)}
      />
      <Sheet>
        <SignUpForm
          workshop={workshop}
          module={module}
          currency={page.workshop.currency}
          offers={page.offers}
          form={form}
        />
      </Sheet>
    </PublicFrame>
  )
}
