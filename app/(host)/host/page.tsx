import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { SignedFrame } from '@/app/_parts/signed-frame'
import { signedIn } from '@/app/_parts/signed-in'
import { PageHead } from '@/components/ui/page-head'
import { can } from '@/lib/core/policy/can'
import { workshopWords as words } from '@/lib/messages/workshops'
import { paths } from '@/lib/paths'
import { listWorkshops } from '@/lib/queries/host/list-workshops'
import { WorkshopTable } from './_parts/workshop-table'

export const metadata: Metadata = { title: words.hostTitle }

export default async function HostPage() {
  const actor = await signedIn(paths.host)
  if (!can(actor, 'host:read')) notFound()
  return (
    <SignedFrame>
      <PageHead title={words.hostTitle} lead={words.hostLead} />
      <WorkshopTable rows={await listWorkshops({ actor })} />
      <p className="max-w-words text-15 text-quiet pt-4">{words.suspendNote}</p>
    </SignedFrame>
  )
}
