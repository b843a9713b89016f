import { PageHead } from '@/components/ui/page-head'
import { Notice } from '@/components/ui/notice'
import { withParams } from '@/components/ui/with-params'
import type { QueueQuery } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { PAPERS_MOST } from '@/lib/queries/packing/get-fulfilment-orders'

type Props = { slug: string; title: string; pdf: string; pdfWords: string; query: QueueQuery; isCut: boolean }

/** Stands above a paper on the screen, and is not printed. */
export function PaperHead({ slug, title, pdf, pdfWords, query, isCut }: Props) {
  return (
    <div className="print:hidden">
      <PageHead
        title={title}
        trail={[{ href: paths.packing(slug), label: words.title }]}
        lead={words.printHint}
        aside={
          <span className="flex flex-wrap gap-x-4">
            <a href={withParams(pdf, query, { size: 'A4' })}>{pdfWords}</a>
            <a href={withParams(pdf, query, { size: 'Letter' })}>{words.letter}</a>
          </span>
        }
      />
      {isCut ? (
        <div className="pb-6">
          <Notice kind="attention" title={words.papersTitle}>
            {words.papersCut(PAPERS_MOST)}
          </Notice>
        </div>
      ) : null}
    </div>
  )
}
