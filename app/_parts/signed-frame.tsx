import type { ComponentProps } from 'react'
import { AccountCorner } from '@/components/site/account-corner'
import { SiteFrame } from '@/components/ui/site-frame'
import { currentActor } from '@/lib/auth/actor'

type Props = Omit<ComponentProps<typeof SiteFrame>, 'account'> & {
  /** Where signing in leads back to. */
  here?: string
}

/** The frame of a page that knows who looks at it. */
export async function SignedFrame({ here, ...frame }: Props) {
  const actor = await currentActor()
  const email = actor.kind === 'person' ? actor.email : null
  return <SiteFrame {...frame} account={<AccountCorner email={email} next={here} />} />
}
