import { PublicFrame } from '@/components/site/public-frame'
import { LinkButton } from '@/components/ui/button'
import { PageHead } from '@/components/ui/page-head'

type Props = { title: string; lead: string; way?: { href: string; label: string } }

/** The page of a mailed link that has nothing more to do: done, replaced, expired or unknown. */
export function LinkEnded({ title, lead, way }: Props) {
  return (
    <PublicFrame>
      <PageHead title={title} lead={lead} />
      {way ? <LinkButton href={way.href}>{way.label}</LinkButton> : null}
    </PublicFrame>
  )
}
