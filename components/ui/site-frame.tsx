import { paths } from '@/lib/paths'
import { ui } from '@/lib/messages/ui'
import { CurrentLinks } from './current-links'
import { type FrameLink, LinkList } from './link-list'
import { TitleBlock, type TitleBlockProps } from './title-block'
import { WordMark } from './word-mark'

type Props = {
  links?: readonly FrameLink[]
  /** Marks the link the page belongs under by itself: for a frame that stays while pages change. */
  marksCurrent?: boolean
  /** Right of the links: who is signed in, a way to sign in or out. */
  account?: React.ReactNode
  /** A line above everything: a notice that this is a demonstration, say. */
  banner?: React.ReactNode
  titleBlock?: TitleBlockProps
  footLinks?: readonly FrameLink[]
  /** Larger targets, for a tablet beside the work. */
  bench?: boolean
  children: React.ReactNode
}

const legal: readonly FrameLink[] = [
  { href: paths.terms, label: ui.terms },
  { href: paths.privacy, label: ui.privacy },
  { href: paths.accessibility, label: ui.accessibility },
]

/** What stands around every page: skip link, word mark with its brim line, navigation, content, title block. */
export function SiteFrame({
  links = [],
  marksCurrent,
  account,
  banner,
  titleBlock,
  footLinks = legal,
  bench,
  children,
}: Props) {
  return (
    <div
      data-bench={bench ? '' : undefined}
      className="mx-auto flex min-h-dvh max-w-page flex-col px-4 sm:px-6"
    >
      <a
        href="#main"
        className="sr-only focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-10 focus:bg-sheet focus:p-3 print:hidden"
      >
        {ui.skipToContent}
      </a>
      <header className="pb-6 print:hidden">
        {banner ? <div className="border-b border-rule py-1.5 text-13 print:hidden">{banner}</div> : null}
        <div className="flex items-baseline gap-1 pt-4">
          <WordMark />
          <span className="brim font-heading text-28" aria-hidden="true" />
          {account ? <div className="pl-3 text-15">{account}</div> : null}
        </div>
        {links.length > 0 ? (
          <nav aria-label={ui.mainNavigation} className="mt-1">
            {marksCurrent ? <CurrentLinks links={links} /> : <LinkList links={links} />}
          </nav>
        ) : null}
      </header>
      <main id="main" tabIndex={-1} className="grow pb-12">
        {children}
      </main>
      <footer className="border-b-2 border-ink print:hidden">
        {footLinks.length > 0 ? (
          <nav aria-label={ui.legalNavigation} className="pb-1">
            <LinkList links={footLinks} />
          </nav>
        ) : null}
        {titleBlock ? <TitleBlock {...titleBlock} /> : null}
      </footer>
    </div>
  )
}
