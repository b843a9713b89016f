import { LinkButton } from '@/components/ui/button'
import { Notice } from '@/components/ui/notice'
import type { CostDesk } from '@/lib/contracts/cost-desk'
import { costWords as words } from '@/lib/messages/costs'
import { paths } from '@/lib/paths'

/** Whose plan the figures rest on, and what is no longer as it was when it was saved. */
export function PlanNotes({ slug, desk }: { slug: string; desk: CostDesk }) {
  const { planOf, changedParts, figures, module } = desk
  return (
    <>
      <p className="text-15 text-quiet">{figures ? words.planOf[planOf] : words.noPlan}</p>
      {changedParts > 0 ? (
        <Notice kind="attention" title={words.changedPartsTitle}>
          <p className="pb-3">{words.changedParts(changedParts)}</p>
          <LinkButton
            kind="secondary"
            href={`${paths.adminModulePage(slug, module.slug, 'parts')}?revision=${desk.run.revision}`}
          >
            {words.toParts}
          </LinkButton>
        </Notice>
      ) : null}
    </>
  )
}
