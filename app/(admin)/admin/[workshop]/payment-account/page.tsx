import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { workshopWords as words } from '@/lib/messages/workshops'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'
import { noteAccountReturn } from './_parts/note-account-return'

export const metadata: Metadata = { title: words.accountTitle }

type Props = { params: Promise<{ workshop: string }>; searchParams: Promise<{ draft?: string }> }

export default async function PaymentAccountPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const actor = await signedIn(paths.adminPaymentAccount(slug))
  const workshop = await getDeskWorkshop({ actor, slug, deed: 'payment_account:read' })
  if (!workshop) notFound()
  const isReady = workshop.chargesEnabled || (await noteAccountReturn(workshop.providerAccountId))
  const kept = keptForm(await getFormDraft((await searchParams).draft, 'payment-account'))
  return (
    <>
      <PageHead title={words.accountTitle} lead={words.accountLead} />
      {isReady ? (
        <Notice kind="done" title={words.cardReady}>
          {words.accountReady}
        </Notice>
      ) : (
        <Form
          action={paths.api.adminAccount(slug)}
          form={kept}
          foot={<Button>{words.accountConnect}</Button>}
        >
          <Notice kind="attention" title={words.cardMissing}>
            {words.accountNotReady}
          </Notice>
        </Form>
      )}
    </>
  )
}
