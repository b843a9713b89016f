import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { HandOverInput } from '@/lib/contracts/packing'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'

export const POST = route(
  {
    deed: 'parcel:hand_over',
    params: z.object({ workshop: slug, parcel: uuid }),
    body: HandOverInput,
    form: {
      name: 'hand-over',
      back: ({ params, draft }) => `${paths.packingParcel(params.workshop, params.parcel)}?draft=${draft}`,
      done: ({ params }) => paths.packingParcel(params.workshop, params.parcel),
    },
  },
  ({ actor, workshop, params, body, now }) =>
    handOverParcel({ actor, workshopId: workshop.id, parcelId: params.parcel, input: body, now }),
)
