import type { ComponentProps } from 'react'
import { SiteFrame } from '@/components/ui/site-frame'
import { publicWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

/** The frame of a page that is the same for everybody: it is kept, so it cannot know who looks at it. */
export function PublicFrame(frame: Omit<ComponentProps<typeof SiteFrame>, 'account'>) {
  return <SiteFrame {...frame} account={<a href={paths.account}>{publicWords.account}</a>} />
}
