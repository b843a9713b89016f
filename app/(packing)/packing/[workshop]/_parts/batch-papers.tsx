import { withParams } from '@/components/ui/with-params'
import { PAPER_KINDS } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { parcelPaperWords } from '@/lib/messages/parcel-papers'
import { paths } from '@/lib/paths'

type Props = { slug: string; query: Readonly<Record<string, string | undefined>> }

/** Every paper of what is shown: a batch, or the queue as it is filtered. */
export function BatchPapers({ slug, query }: Props) {
  const papers = [
    { paper: 'list', label: words.listTitle },
    { paper: 'slips', label: words.slipsTitle },
    ...PAPER_KINDS.map((paper) => ({ paper, label: parcelPaperWords.names[paper] })),
  ] as const
  return (
    <nav aria-label={words.papersTitle} className="print:hidden">
      <ul className="flex flex-wrap gap-x-6 gap-y-1">
        {papers.map(({ paper, label }) => (
          <li key={paper}>
            <a
              href={withParams(paths.packingPapers(slug, paper), query, { after: null })}
              className="inline-flex min-h-11 items-center"
            >
              {label}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  )
}
