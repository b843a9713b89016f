import 'server-only'
import { lapseOrder } from '@/lib/services/balances/lapse-order'
import { remindBalance } from '@/lib/services/balances/remind-balance'
import { startBalanceCharges } from '@/lib/services/balances/start-balance-charges'
import { callOffUndecided } from '@/lib/services/runs/call-off-run'
import { refreshRunPage } from '@/lib/services/runs/refresh-run-page'
import type { DueHandler } from './due-kinds'

/** A balance announced seven days ago: its run's are charged by one bulk job. */
export const balanceCharge: DueHandler = async ({ subjectId }, now) =>
  void (await startBalanceCharges({ orderId: subjectId, now }))

export const balanceReminder: DueHandler = async ({ subjectId }, now) =>
  void (await remindBalance({ orderId: subjectId, now }))

/** Stays due while the provider has not said what became of a payment. */
export const orderLapse: DueHandler = async ({ subjectId }, now) => {
  const lapsed = await lapseOrder({ orderId: subjectId, now })
  if (!lapsed.ok) throw new Error(`order ${subjectId} cannot lapse yet: ${lapsed.reason}`)
}

/** A run that has posted something is its owner's to end, whatever the clock says. */
export const decideByPassed: DueHandler = async ({ subjectId }, now) =>
  void (await callOffUndecided({ runId: subjectId, now }))

export const runPage: DueHandler = async ({ subjectId }, now) =>
  void (await refreshRunPage({ runId: subjectId, now }))
