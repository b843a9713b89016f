import 'server-only'
import type { Transaction } from 'sequelize'
import { setDue } from '@/lib/jobs/set-due'
import type { Run } from '@/models'

/** Writes down when the forecast of a run is kept next: as a quarter of its window ends. Locks: nothing. Repeat: safe; it moves. */
export async function setForecastDue(tx: Transaction, run: Run, now: Date): Promise<void> {
  const { openedAt, decideByAt } = run
  if (openedAt === null) return
  const at = [1, 2, 3]
    .map(
      (quarter) => new Date(openedAt.getTime() + ((decideByAt.getTime() - openedAt.getTime()) * quarter) / 4),
    )
    .find((instant) => instant > now)
  if (at) await setDue(tx, { kind: 'run_forecast', subjectId: run.id, workshopId: run.workshopId, at })
}
