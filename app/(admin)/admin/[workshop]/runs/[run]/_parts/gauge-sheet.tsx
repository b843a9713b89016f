import { FillGauge } from '@/components/charts/fill-gauge'
import { Sheet } from '@/components/ui/sheet'
import type { RunPage } from '@/lib/contracts/run-page'
import { daysBetween } from '@/lib/core/time/day'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

/** How full the run is, with what confirmed sign-ups are expected to bring: the owner's own gauge. */
export function GaugeSheet({ page }: { page: RunPage }) {
  const { figures, minimum, maximum, decideBy, today, state, workshop, module } = page
  const { mean, low, high } = figures.forecast
  // More than the maximum finds no place.
  const fits = (units: number) => Math.min(units, maximum)
  const isOpen = state === 'draft' || state === 'taking_deposits'
  return (
    <Sheet
      title={words.gauge}
      aside={<a href={paths.module(workshop.slug, module.slug)}>{words.publicPage}</a>}
    >
      <FillGauge
        size="large"
        deposited={figures.deposited}
        minimum={minimum}
        maximum={maximum}
        {...(isOpen && { forecast: { mean: fits(mean), low: fits(low), high: fits(high) } })}
        {...(isOpen && { daysLeft: Math.max(0, daysBetween(today, decideBy)), decideBy })}
      />
    </Sheet>
  )
}
