import { When } from '@/components/format/when'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { RunPage } from '@/lib/contracts/run-page'
import { decision } from '@/lib/messages/decision'
import { readinessTitles } from '@/lib/messages/readiness'
import { runWords as words } from '@/lib/messages/runs'

type Props = { page: RunPage; decided: NonNullable<RunPage['decided']> }

/** The figures frozen with the lock, and what was let pass with which reason. */
export function DecidedSheet({ page, decided }: Props) {
  const { workshop } = page
  const { figures, weighed, waived, at, coreVersion } = decided
  const then = { ...page, figures, weighed, locale: workshop.locale, notReady: 0 }
  const { starts } = figures
  return (
    <Sheet title={words.decidedTitle}>
      <p className="pb-3 text-15 text-quiet">{words.decidedLead(coreVersion)}</p>
      <p className="max-w-words pb-3">{decision.carried(then)}</p>
      <Facts
        facts={[
          { name: words.lockedOn, value: <When at={at} zone={workshop.timeZone} /> },
          ...decision.figures(then),
          ...decision.weighedFacts(then),
          ...(starts === null ? [] : [{ name: words.starts, value: decision.starts(starts) }]),
          ...waived.map(({ key, reason }) => ({ name: words.letPass(readinessTitles[key]), value: reason })),
        ]}
      />
    </Sheet>
  )
}
