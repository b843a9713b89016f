import { z } from 'zod'
import { line, optionalLine, tick, uuid, wholeNumber } from './fields'

export type QueueItem = {
  order: string
  number: string
  country: string
  name: string
  postedBy: string
  lines: { line: string; offer: 'boards' | 'kit' | 'built'; quantity: number }[]
  parcel: string
}

const millimetres = z.preprocess(
  (typed) => (typed === '' ? undefined : typed),
  wholeNumber(1, 3000).optional(),
)

export const PackInput = z.object({
  lines: z
    .array(
      z.object({
        line: uuid,
        quantity: wholeNumber(1, 100),
        serials: z.array(line(60)).max(100).optional(),
      }),
      { error: 'Tick the lines that are in the parcel.' },
    )
    .min(1, 'Tick the lines that are in the parcel.'),
  grams: wholeNumber(1, 40_000, 'Enter the weight in whole grams, from 1 to 40000.'),
  lengthMm: millimetres,
  widthMm: millimetres,
  heightMm: millimetres,
  weightConfirmed: tick.optional(),
})
export type PackInput = z.infer<typeof PackInput>

export const HandOverInput = z.object({
  service: line(60, 'Choose the service.'),
  tracking: optionalLine(40),
})
export type HandOverInput = z.infer<typeof HandOverInput>
