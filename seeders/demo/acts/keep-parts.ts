import { PartsInput, SampleInput } from '@/lib/contracts/module-forms'
import { PART_HEADINGS } from '@/lib/contracts/parts-list'
import { recordSampleCheck } from '@/lib/services/modules/record-sample-check'
import { saveParts } from '@/lib/services/modules/save-parts'
import { Part } from '@/models'
import type { Stage } from '../stage'
import { dayAfter } from './days'
import { done } from './done'
import type { Founded } from './found-workshop'

/** A line of a parts list: who places it in a kit ('buyer', or 'assembler' for the small ones) and its price breaks. */
export type PartLine = {
  code: string
  description: string
  value?: string
  designators: string
  perUnit: number
  kit: 'assembler' | 'buyer'
  built: 'assembler' | 'maker'
  sample?: true
  supplyPins?: number
  /** How a connector goes in. */
  polarity?: string
  breaks: string
  stock: number
}

/** The parts list as pasted, its quotes and stock seen these days, and the samples looked at. */
export async function keepParts(
  stage: Stage,
  house: Founded,
  list: { module: string; revision: string; lines: readonly PartLine[] },
): Promise<void> {
  const { workshopId } = house
  const [actor, now] = [await stage.person(house.owner), await stage.now()]
  const { module, revision, lines } = list
  const input = PartsInput.parse({ revision, csv: csvOf(lines, now) })
  done(await saveParts({ actor, workshopId, module, input, now }), `${module}: parts list`)
  for (const { code } of lines.filter(({ sample }) => sample)) {
    const part = await Part.findOne({ where: { workshopId, code }, rejectOnEmpty: true })
    if (part.sampleCheckedOn !== null) continue
    const seen = {
      part: part.id,
      fits: 'yes',
      on: dayAfter(now, -3),
      note: 'Fits the front panel and the footprint.',
    }
    done(
      await recordSampleCheck({ actor, workshopId, input: SampleInput.parse(seen), now }),
      `${module}: sample of ${code}`,
    )
  }
}

function csvOf(lines: readonly PartLine[], now: Date): string {
  const rows = lines.map((line) => {
    const cells: Partial<Record<(typeof PART_HEADINGS)[number], string | number>> = {
      code: line.code,
      description: line.description,
      value: line.value ?? '',
      designators: line.designators,
      per_unit: line.perUnit,
      kit: line.kit,
      built: line.built,
      attrition_percent: line.built === 'assembler' ? 2 : 1,
      attrition_least: line.built === 'assembler' ? 5 : 1,
      needs_sample: line.sample ? 'yes' : 'no',
      supply_pins: line.supplyPins ?? 0,
      polarity: line.polarity ?? '',
      supplier: 'Brasswick Components',
      currency: 'EUR',
      breaks: line.breaks,
      lead_days: 5,
      quoted_on: dayAfter(now, -4),
      stock_seen: line.stock,
      stock_seen_on: dayAfter(now, -1),
    }
    return PART_HEADINGS.map((heading) => quoted(cells[heading] ?? '')).join(',')
  })
  return [PART_HEADINGS.join(','), ...rows].join('\n')
}

const quoted = (cell: string | number) => `"${String(cell).replaceAll('"', '""')}"`
