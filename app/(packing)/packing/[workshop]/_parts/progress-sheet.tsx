import { Stack } from '@/components/ui/columns'
import { Progress } from '@/components/ui/progress'
import type { PackSummary } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'

/** How many orders of each run under way are posted. */
export function ProgressSheet({ progress }: Pick<PackSummary, 'progress'>) {
  if (progress.length === 0) return null
  return (
    <Stack gap="narrow">
      {progress.map(({ run, module, number, posted, total }) => (
        <Progress key={run} label={words.progress(module, number)} done={posted} total={total} />
      ))}
    </Stack>
  )
}
