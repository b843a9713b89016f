import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { PackInput } from '@/lib/contracts/packing'
import { readPackForm } from '@/lib/contracts/pack-form'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { packParcel } from '@/lib/services/packing/pack-parcel'

export const POST = route(
  {
    deed: 'parcel:pack',
    params: z.object({ workshop: slug, parcel: uuid }),
    body: PackInput,
    form: {
      name: 'pack',
      back: ({ params, draft }) => `${paths.packingParcel(params.workshop, params.parcel)}?draft=${draft}`,
      done: ({ params }) => paths.packingParcel(params.workshop, params.parcel),
      reads: readPackForm,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    packParcel({ actor, workshopId: workshop.id, parcelId: params.parcel, input: body, now }),
)
