import { RunLine } from '@/components/charts/run-line'
import { ReadinessList } from '@/components/run/readiness-list'
import { VerdictSheet } from '@/components/run/verdict-sheet'
import { Columns, Stack } from '@/components/ui/columns'
import { Sheet } from '@/components/ui/sheet'
import type { RunPage } from '@/lib/contracts/run-page'
import { readinessOfPage } from '@/lib/messages/readiness'
import { runWords as words } from '@/lib/messages/runs'
import type { KeptForm } from '@/lib/queries/forms/get-form-draft'
import { BulkSheet } from './bulk-sheet'
import { DecidedSheet } from './decided-sheet'
import { DeedsSheet } from './deeds-sheet'
import { FiguresSheet } from './figures-sheet'
import { GaugeSheet } from './gauge-sheet'

type Props = { page: RunPage; closed: KeptForm | null }

/** What is so on the left, what follows from it on the right. */
export function RunColumns({ page, closed }: Props) {
  const readiness = readinessOfPage(page)
  const notReady = readiness.filter(({ state }) => state === 'missing' || state === 'unknown').length
  const isOpen = page.state === 'draft' || page.state === 'taking_deposits'
  return (
    <Columns>
      <Stack>
        <GaugeSheet page={page} />
        <VerdictSheet {...page} locale={page.workshop.locale} notReady={notReady} />
        {isOpen ? (
          <Sheet title={words.readiness} id="readiness">
            <p className="max-w-words pb-3 text-15 text-quiet">{words.readinessLead}</p>
            <ReadinessList lines={readiness} workshop={page.workshop.slug} module={page.module.slug} />
          </Sheet>
        ) : null}
        {page.decided ? <DecidedSheet page={page} decided={page.decided} /> : null}
        {page.runLine ? (
          <Sheet title={words.runLine}>
            <RunLine {...page.runLine} today={page.today} />
          </Sheet>
        ) : null}
      </Stack>
      <Stack>
        <DeedsSheet page={page} closed={closed} />
        <FiguresSheet page={page} />
        <BulkSheet page={page} />
      </Stack>
    </Columns>
  )
}
