import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { withParams } from '@/components/ui/with-params'
import { LABEL_SIZES, type PaperKind, type ParcelPaperQuery, SHEET_SIZES } from '@/lib/contracts/packing'
import { packingWords } from '@/lib/messages/packing'
import { parcelPaperWords as words } from '@/lib/messages/parcel-papers'
import { paths } from '@/lib/paths'
import { PAPERS_MOST } from '@/lib/queries/packing/get-fulfilment-orders'

type Props = { slug: string; kind: PaperKind; query: ParcelPaperQuery; isCut: boolean }

/** Stands above a paper on the screen and is not printed: the sizes it can be had in. */
export function ParcelPaperHead({ slug, kind, query, isCut }: Props) {
  const { size: _size, ...chosen } = query
  const sizes = kind === 'labels' || kind === 'customs' ? [...LABEL_SIZES, ...SHEET_SIZES] : SHEET_SIZES
  return (
    <div className="print:hidden">
      <PageHead
        title={words.names[kind]}
        trail={[{ href: paths.packing(slug), label: packingWords.title }]}
        lead={`${words.leads[kind]} ${packingWords.printHint}`}
      />
      <p className="flex flex-wrap gap-x-5 gap-y-1 pb-6">
        {words.pdf}:
        {sizes.map((size) => (
          <a key={size} href={withParams(paths.api.packingPaper(slug, kind), chosen, { size })}>
            {words.sizes[size]}
          </a>
        ))}
      </p>
      {isCut ? (
        <div className="pb-6">
          <Notice kind="attention" title={packingWords.papersTitle}>
            {packingWords.papersCut(PAPERS_MOST)}
          </Notice>
        </div>
      ) : null}
    </div>
  )
}
