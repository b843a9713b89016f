'use client'
import { Button } from '@/components/ui/button'
import { PageHead } from '@/components/ui/page-head'
import { SiteFrame } from '@/components/ui/site-frame'
import { ui } from '@/lib/messages/ui'

export default function ErrorPage({
  error,
  reset,
}: {
  error: Error & { digest?: string }
  reset: () => void
}) {
  return (
    <SiteFrame>
      <PageHead title={ui.brokeTitle} lead={ui.brokeWords} />
      {error.digest ? <p className="figures pb-4">{error.digest}</p> : null}
      <Button type="button" onClick={reset}>
        {ui.tryAgain}
      </Button>
    </SiteFrame>
  )
}
