import type { BagList, ParcelPaper, ParcelPapers } from '@/lib/contracts/papers'
import type { PaperKind } from '@/lib/contracts/packing'
import { parcelPaperWords as words } from '@/lib/messages/parcel-papers'
import { bagParts } from './bag-lists'
import type { PaperPart } from './blocks'
import { customsPart } from './customs-form'
import { handOverPart } from './hand-over-list'
import { invoicePart } from './commercial-invoice'
import { labelPart } from './address-label'
import { returnPart } from './return-slip'

/** A paper of one kind: its parts, and the parcels that must not have it yet. */
export type BuiltPaper = { name: string; parts: PaperPart[]; blocked: ParcelPaper[] }

const isStopped = ({ customs }: ParcelPaper) => customs.problems.some(({ severity }) => severity === 'error')

/**
 * The parts of a paper. A parcel whose declaration is not complete gets no label, form or invoice: what the post would
 * send back is not printed.
 */
export function buildPaper(kind: PaperKind, papers: ParcelPapers, bags: readonly BagList[]): BuiltPaper {
  const name = words.names[kind]
  if (kind === 'bags') return { name, parts: bagParts(bags), blocked: [] }
  const { parcels } = papers
  if (kind === 'hand-over')
    return { name, parts: parcels.length > 0 ? [handOverPart(papers)] : [], blocked: [] }
  if (kind === 'returns')
    return { name, parts: parcels.map((parcel) => returnPart(papers, parcel)), blocked: [] }
  const blocked = parcels.filter(isStopped)
  const free = parcels.filter((parcel) => !isStopped(parcel))
  const parts = {
    labels: () => free.map((parcel) => labelPart(papers, parcel)),
    customs: () => free.flatMap((parcel) => customsPart(papers, parcel) ?? []),
    invoices: () => free.flatMap((parcel) => invoicePart(papers, parcel) ?? []),
  }
  return { name, parts: parts[kind](), blocked }
}
