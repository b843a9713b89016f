import { ui } from '@/lib/messages/ui'

/** Ways on from a list: the first page, the next one, and the same rows as a file. Nothing to show, nothing shown. */
export function Paging({
  firstHref,
  nextHref,
  csvHref,
}: {
  firstHref?: string
  nextHref?: string
  csvHref?: string
}) {
  if (!firstHref && !nextHref && !csvHref) return null
  const link = 'inline-flex min-h-11 items-center'
  return (
    <div className="text-15 flex flex-wrap items-center justify-between gap-x-6 pt-2 print:hidden">
      {firstHref || nextHref ? (
        <nav aria-label={ui.paging} className="flex gap-x-6">
          {firstHref ? (
            <a href={firstHref} className={link}>
              {ui.first}
            </a>
          ) : null}
          {nextHref ? (
            <a href={nextHref} rel="next" className={link}>
              {ui.next}
            </a>
          ) : null}
        </nav>
      ) : (
        <span />
      )}
      {csvHref ? (
        <a href={csvHref} download className={link}>
          {ui.csv}
        </a>
      ) : null}
    </div>
  )
}
