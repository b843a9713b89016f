import { Columns, Stack } from '@/components/ui/columns'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import { BuildSheet, CallOffSheet, CashSheet, RatesSheet } from './around-sheets'
import { MoversSheet } from './movers-sheet'
import { ProfitSheet } from './profit-sheet'
import { UnitSheet } from './unit-sheet'

/** Everything a run's costs come to. Drawn by the server, and again in the browser when a figure changes. */
export function CostSheets({ figures }: { figures: CostFigures }) {
  return (
    <Columns>
      <Stack>
        <ProfitSheet figures={figures} />
        <CashSheet figures={figures} />
        <BuildSheet figures={figures} />
      </Stack>
      <Stack>
        <UnitSheet figures={figures} />
        <MoversSheet figures={figures} />
        <CallOffSheet figures={figures} />
        <RatesSheet figures={figures} />
      </Stack>
    </Columns>
  )
}
