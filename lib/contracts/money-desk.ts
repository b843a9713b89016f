import { z } from 'zod'
import type { InvoiceView } from './papers'

/** A month, 'YYYY-MM'. */
export const month = z.string().regex(/^\d{4}-(0[1-9]|1[0-2])$/, 'Enter a month as YYYY-MM.')
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
