import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { reopenParcel } from '@/lib/services/packing/reopen-parcel'

export const POST = route(
  {
    deed: 'parcel:reopen',
    params: z.object({ workshop: slug, parcel: uuid }),
    form: {
      name: 'reopen',
      back: ({ params, draft }) => `${paths.packingParcel(params.workshop, params.parcel)}?draft=${draft}`,
      done: ({ params }) => paths.packingParcel(params.workshop, params.parcel),
    },
  },
  ({ actor, workshop, params, now }) =>
    reopenParcel({ actor, workshopId: workshop.id, parcelId: params.parcel, now }),
)
