import { withParams } from '@/components/ui/with-params'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** The papers of one batch. */
export function BatchPapers({ slug, batch }: { slug: string; batch: string }) {
  const href = (paper: 'list' | 'slips') => withParams(paths.packingPapers(slug, paper), { batch }, {})
  return (
    <p className="flex flex-wrap gap-x-6 gap-y-2 print:hidden">
      <a href={href('list')}>{words.batch.list}</a>
      <a href={href('slips')}>{words.batch.slips}</a>
    </p>
  )
}
