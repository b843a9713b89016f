import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { PageHead } from '@/components/ui/page-head'
import { sandboxWords } from '@/lib/messages/sandbox'
import { paths } from '@/lib/paths'
import { readMails } from '@/lib/services/sandbox/read-mails'
import { FilterForm } from './_parts/filter-form'
import { MailList } from './_parts/mail-list'

const words = sandboxWords.mail

export const metadata: Metadata = { title: words.title, robots: { index: false } }
export const dynamic = 'force-dynamic'

type Props = { searchParams: Promise<{ to?: string }> }

export default async function SandboxMailPage({ searchParams }: Props) {
  const to = (await searchParams).to?.trim() || undefined
  const mails = await readMails({ to })
  if (!mails.ok) notFound()
  return (
    <SignedFrame here={paths.sandboxMail(to)}>
      <PageHead
        title={words.title}
        lead={words.lead}
        trail={[{ href: paths.sandbox, label: sandboxWords.title }]}
      />
      <FilterForm to={to} />
      <MailList mails={mails.value.items} />
    </SignedFrame>
  )
}
