import { HandOverInput, PackInput } from '@/lib/contracts/packing'
import { s10CheckDigit } from '@/lib/core/post/s10'
import { getParcelPage } from '@/lib/queries/packing/get-parcel-page'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { handOverParcel } from '@/lib/services/packing/hand-over-parcel'
import { packParcel } from '@/lib/services/packing/pack-parcel'
import type { Stage } from '../stage'
import { done } from './done'
import type { Founded } from './found-workshop'

let serial = 41_730_000

/** A tracking number of the post, with its check digit; the next one each time. */
function tracking(country: string): string {
  serial += 17
  return `CP${serial}${s10CheckDigit(String(serial))}${country}`
}

/** The packer packs the oldest promises first and hands them over, at most so many. Gives back how many. */
export async function packAndPost(
  stage: Stage,
  house: Founded,
  given: { packer: string; most: number; from: string; isHandedOver?: boolean },
): Promise<number> {
  const { workshopId } = house
  const [actor, now] = [await stage.person(given.packer), await stage.now()]
  const { items } = await listPackQueue({ actor, workshopId, limit: given.most })
  for (const { parcel: parcelId } of items) {
    const page = await getParcelPage({ actor, workshopId, parcelId, now })
    if (!page || page.expectedGrams === null) throw new Error('the demo: a parcel nobody can weigh')
    const lines = page.lines.map(({ line, quantity }) => ({ line, quantity }))
    const packed = PackInput.parse({
      lines,
      grams: page.expectedGrams,
      lengthMm: 220,
      widthMm: 160,
      heightMm: 60,
    })
    done(await packParcel({ actor, workshopId, parcelId, input: packed, now }), 'packing')
    if (given.isHandedOver === false) continue
    const service = page.quotedService ?? page.services[0]?.name ?? 'Parcel'
    const input = HandOverInput.parse({ service, tracking: tracking(given.from) })
    done(await handOverParcel({ actor, workshopId, parcelId, input, now }), 'handing over')
  }
  await stage.settle()
  return items.length
}
