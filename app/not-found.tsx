import type { Metadata } from 'next'
import { LinkButton } from '@/components/ui/button'
import { PageHead } from '@/components/ui/page-head'
import { SiteFrame } from '@/components/ui/site-frame'
import { ui } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'

export const metadata: Metadata = { title: ui.notFoundTitle }

export default function NotFound() {
  return (
    <SiteFrame>
      <PageHead title={ui.notFoundTitle} lead={ui.notFoundWords} />
      <LinkButton href={paths.home}>{ui.toHome}</LinkButton>
    </SiteFrame>
  )
}
