import { classNames } from './class-names'
import { TitleBlock, type TitleBlockProps } from './title-block'

type Props = {
  title?: React.ReactNode
  /** Heading level of the title; the page's own is 1. */
  level?: 2 | 3
  id?: string
  /** Stands at the right of the title: a link, a state. */
  aside?: React.ReactNode
  titleBlock?: TitleBlockProps
  /** No padding: for a table or drawing that runs to the edge. */
  flush?: boolean
  className?: string
  children: React.ReactNode
}

/** A ruled area of paper: a heading on its own line, the content, and the title block at its foot. */
export function Sheet({ title, level = 2, id, aside, titleBlock, flush, className, children }: Props) {
  const Heading = level === 2 ? 'h2' : 'h3'
  const headingId = id ? `${id}-title` : undefined
  return (
    <section
      id={id}
      aria-labelledby={title ? headingId : undefined}
      className={classNames('border-rule border-t-ink bg-sheet overflow-hidden border border-t-2', className)}
    >
      {title ? (
        <div className="flex flex-wrap items-baseline justify-between gap-x-4 gap-y-1 px-4 pt-3 sm:px-6">
          <Heading id={headingId} className={level === 2 ? 'text-21' : 'text-17'}>
            {title}
          </Heading>
          {aside ? <div className="text-15">{aside}</div> : null}
        </div>
      ) : null}
      <div className={flush ? 'pt-3' : 'px-4 pt-3 pb-5 sm:px-6'}>{children}</div>
      {titleBlock ? <TitleBlock {...titleBlock} /> : null}
    </section>
  )
}
