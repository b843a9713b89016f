import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { PublicFrame } from '@/components/site/public-frame'
import { LinkButton } from '@/components/ui/button'
import { Words } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { ModuleParams } from '@/lib/contracts/module-forms'
import { signUpWords as words } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'

export const dynamic = 'force-static'
export const dynamicParams = true
export const revalidate = false
export const generateStaticParams = () => []

export const metadata: Metadata = { title: words.sentTitle, robots: { index: false } }

type Props = { params: Promise<{ workshop: string; module: string }> }

export default async function SignUpSentPage({ params }: Props) {
  const named = ModuleParams.safeParse(await params)
  if (!named.success) notFound()
  return (
    <PublicFrame>
      <PageHead title={words.sentTitle} lead={words.sentLead} />
      <Words>
        <p>{words.sentLater}</p>
      </Words>
      <p className="pt-5">
        <LinkButton href={paths.module(named.data.workshop, named.data.module)}>{words.toModule}</LinkButton>
      </p>
    </PublicFrame>
  )
}
