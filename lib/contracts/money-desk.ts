import { z } from 'zod'
import { uuid } from './fields'
import type { InvoiceView } from './papers'

/** A month, 'YYYY-MM'. */
const month = z.string().regex(/^\d{4}-(0[1-9]|1[0-2])$/, 'Enter a month as YYYY-MM.')
export const MonthQuery = z.object({ month })
export const YearQuery = z.object({
  year: z
    .string()
    .regex(/^\d{4}$/, 'Enter a year as YYYY.')
    .optional(),
})

/** What fell due in a month at one rate of one country. */
export type TaxReportRow = {
  /** 'YYYY-MM', in the workshop's zone. */
  month: string
  country: string
  /** 19 % is 1900. */
  basisPoints: number
  netMinor: number
  taxMinor: number
  grossMinor: number
}
export type TaxReport = {
  year: string
  /** Years there is something of, newest first. */
  years: string[]
  currency: string
  /** Whether tax falls due when a payment arrives, as the workshop is set now. */
  isTaxedOnArrival: boolean
  rows: TaxReportRow[]
}

/** A numbered paper in the owner's list. */
export type InvoiceListItem = InvoiceView & { order: string; orderNumber: number }

/** A movement of the books, with what it did to each account. */
export type StatementLine = {
  id: string
  at: string
  kind: string
  order: string | null
  orderNumber: number | null
  entries: { account: string; currency: string; amountMinor: number }[]
}
export type Statement = {
  lines: StatementLine[]
  sums: { account: string; currency: string; amountMinor: number }[]
}

/** What is taken up when its button is pressed. */
export const StuckInput = z.object({
  kind: z.enum(['attempt', 'refund', 'dispute', 'event']),
  id: uuid,
})
export type StuckInput = z.infer<typeof StuckInput>

/** Something that should have settled by now. */
export type StuckItem = {
  kind: StuckInput['kind']
  id: string
  state: string
  order: string | null
  orderNumber: number | null
  amountMinor: number | null
  currency: string | null
  since: string
  /** The provider's code, or what kind of event it is; null where there is none. */
  detail: string | null
}

type SumOf = { amount: number; currency: string } | null

/** The last comparison with the provider's lists, null before the first; and what is stuck. */
export type MoneyDesk = {
  compared: {
    at: string
    items: number
    differences: {
      kind: 'missing_here' | 'missing_there' | 'amount' | 'currency'
      id: string
      isFee: boolean
      ours: SumOf
      theirs: SumOf
      order: string | null
      orderNumber: number | null
    }[]
  } | null
  stuck: StuckItem[]
}

/** A line of the month's export: one entry of the books. */
export type LedgerExportLine = {
  at: string
  transfer: string
  kind: string
  orderNumber: number | null
  account: string
  amountMinor: number
  currency: string
}
