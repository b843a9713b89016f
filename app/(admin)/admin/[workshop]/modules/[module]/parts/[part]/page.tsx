import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { keptForm } from '@/components/forms/kept-form'
import { Columns, Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { uuid } from '@/lib/contracts/fields'
import { dayIn } from '@/lib/core/time/zone'
import { businessNow } from '@/lib/http/business-now'
import { partWords as words } from '@/lib/messages/parts'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getPartDesk } from '@/lib/queries/modules-admin/get-part-desk'
import { loadModule } from '../../_parts/load-module'
import { SampleForm } from '../../_parts/sample-form'
import { AlternatesSheet } from './_parts/alternates-sheet'
import { PartFacts } from './_parts/part-facts'
import { QuoteForm } from './_parts/quote-form'
import { QuotesTable } from './_parts/quotes-table'
import { StockForm } from './_parts/stock-form'

export const metadata: Metadata = { title: words.title }

type Props = {
  params: Promise<{ workshop: string; module: string; part: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function PartPage({ params, searchParams }: Props) {
  const { actor, workshop, desk } = await loadModule(params)
  const { part: id } = await params
  const { draft, saved } = await searchParams
  const at = { slug: workshop.slug, module: desk.module.slug }
  const today = dayIn(await businessNow(), workshop.timeZone)
  const asked = { actor, workshopId: workshop.id, module: at.module, part: id, today }
  const part = uuid.safeParse(id).success ? await getPartDesk(asked) : null
  if (!part) notFound()
  const kept = async (form: string) => keptForm(await getFormDraft(draft, form))
  const line = { partId: part.id, code: part.code, sample: part.sample.state }
  return (
    <>
      <PageHead
        title={part.code}
        lead={[part.value, part.description].filter((text) => text !== '').join(', ')}
        trail={[{ href: paths.adminModulePage(at.slug, at.module, 'parts'), label: words.toParts }]}
      />
      <Stack>
        <OutcomeNotice form="module-deed" draft={draft} saved={saved} />
        <QuotesTable part={part} />
        <Columns>
          <Stack>
            <QuoteForm
              {...at}
              part={part.id}
              today={today}
              currency={workshop.currency}
              form={await kept('quote')}
            />
          </Stack>
          <Stack>
            <PartFacts part={part} />
            <StockForm {...at} part={part} form={await kept('stock')} />
            <AlternatesSheet {...at} part={part} form={await kept('alternate')} />
            <SampleForm {...at} lines={[line]} today={today} />
          </Stack>
        </Columns>
      </Stack>
    </>
  )
}
