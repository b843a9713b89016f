import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { z } from 'zod'
import { AddressLines } from '@/components/parcel/address-lines'
import { keptForm } from '@/components/forms/kept-form'
import { Columns, Stack } from '@/components/ui/columns'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import { businessNow } from '@/lib/http/business-now'
import { packingWords as words } from '@/lib/messages/packing'
import { reasonWords } from '@/lib/messages/reasons'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { getParcelPage } from '@/lib/queries/packing/get-parcel-page'
import { packingDesk } from '../../_parts/packing-desk'
import { HoldForm } from './_parts/hold-form'
import { HandOverForm } from './_parts/hand-over-form'
import { LeftSheet } from './_parts/left-sheet'
import { PackForm } from './_parts/pack-form'
import { PaperLinks } from './_parts/paper-links'
import { ReportForm } from './_parts/report-form'
import { UnpackForm } from './_parts/unpack-form'

export const metadata: Metadata = { title: words.parcel }

const MARKS = {
  open: 'open',
  packed: 'attention',
  handed_over: 'done',
  delivered: 'done',
  lost: 'stopped',
  returned: 'stopped',
  discarded: 'stopped',
} as const

type Props = {
  params: Promise<{ workshop: string; parcel: string }>
  searchParams: Promise<{ draft?: string }>
}

export default async function ParcelRoute({ params, searchParams }: Props) {
  const { workshop: slug, parcel: parcelId } = await params
  const { actor, workshop } = await packingDesk(slug, paths.packingParcel(slug, parcelId))
  if (!z.uuid().safeParse(parcelId).success) notFound()
  const parcel = await getParcelPage({
    ...{ actor, workshopId: workshop.id, parcelId },
    now: await businessNow(),
  })
  if (!parcel) notFound()
  const { draft } = await searchParams
  const packing = await getFormDraft(draft, 'pack')
  const handing = keptForm((await getFormDraft(draft, 'hand-over')) ?? (await getFormDraft(draft, 'reopen')))
  const mayGo = parcel.stop === null
  return (
    <>
      <PageHead
        title={words.parcelTitle(parcel.orderNumber)}
        trail={[{ href: paths.packing(slug), label: words.title }]}
        lead={words.parcelOf(parcel.number, parcel.nth, parcel.of)}
        aside={<StateMark kind={MARKS[parcel.state]}>{words.states[parcel.state]}</StateMark>}
      />
      <Stack>
        {parcel.stop === null ? null : (
          <Notice kind="stopped" title={words.stop} live>
            {reasonWords(parcel.stop)} {parcel.onHoldReason}
            {parcel.otherPacker === null
              ? null
              : words.otherPacker(parcel.otherPacker || words.batch.somebody)}
          </Notice>
        )}
        <Columns>
          <Stack>
            {parcel.state === 'open' && mayGo ? (
              <PackForm
                slug={slug}
                parcel={parcel}
                form={keptForm(packing)}
                surprise={packing?.reason === 'weight_surprise'}
              />
            ) : (
              <LeftSheet parcel={parcel} />
            )}
            {parcel.state === 'packed' && mayGo ? (
              <HandOverForm slug={slug} parcel={parcel} form={handing} />
            ) : null}
            <ReportForm slug={slug} parcel={parcel} />
            {parcel.state === 'packed' ? <UnpackForm slug={slug} parcel={parcel.parcel} /> : null}
            {parcel.handedOverAt === null && parcel.state !== 'discarded' ? (
              <HoldForm
                slug={slug}
                parcel={parcel.parcel}
                isOnHold={parcel.onHoldReason !== null}
                form={keptForm(await getFormDraft(draft, 'hold'))}
              />
            ) : null}
            {parcel.state === 'open' ? null : (
              <a href={parcel.batch ? paths.packingBatch(slug, parcel.batch.id) : paths.packing(slug)}>
                {words.next}
              </a>
            )}
          </Stack>
          <div>
            <Sheet title={words.address} id="address">
              {parcel.to.length > 0 ? (
                <AddressLines lines={parcel.to} />
              ) : (
                <p className="text-15 text-quiet">{words.addressGone}</p>
              )}
              {parcel.toOwnScript ? (
                <div className="mt-3 border-t border-rule pt-3">
                  <p className="text-13 text-quiet">{words.ownScript}</p>
                  <AddressLines lines={parcel.toOwnScript} />
                </div>
              ) : null}
              <PaperLinks slug={slug} parcel={parcel.parcel} />
            </Sheet>
          </div>
        </Columns>
      </Stack>
    </>
  )
}
