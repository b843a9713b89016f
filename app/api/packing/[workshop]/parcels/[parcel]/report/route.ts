import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { ReportInput } from '@/lib/contracts/tracking'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { reportParcel } from '@/lib/services/packing/report-parcel'

export const POST = route(
  {
    deed: 'parcel:report',
    params: z.object({ workshop: slug, parcel: uuid }),
    body: ReportInput,
    form: {
      name: 'report',
      back: ({ params, draft }) => `${paths.packingParcel(params.workshop, params.parcel)}?draft=${draft}`,
      done: ({ params }) => paths.packingParcel(params.workshop, params.parcel),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    reportParcel({ actor, workshopId: workshop.id, parcelId: params.parcel, input: body, now }),
)
