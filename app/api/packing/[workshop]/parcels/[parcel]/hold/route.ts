import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { HoldInput } from '@/lib/contracts/packing'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { holdParcel } from '@/lib/services/packing/hold-parcel'

export const POST = route(
  {
    deed: 'parcel:hold',
    params: z.object({ workshop: slug, parcel: uuid }),
    body: HoldInput,
    form: {
      name: 'hold',
      back: ({ params, draft }) => `${paths.packingParcel(params.workshop, params.parcel)}?draft=${draft}`,
      done: ({ params }) => paths.packingParcel(params.workshop, params.parcel),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    holdParcel({
      actor,
      workshopId: workshop.id,
      parcelId: params.parcel,
      reason: body.reason,
      now,
    }),
)
