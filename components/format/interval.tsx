import { writtenNumber } from '@/lib/messages/written'
import { Figure } from './figure'

type Props = { value?: number; low: number; high: number; unit?: string; digits?: number; locale?: string }

/** A range, and the value in it where there is one: "52 (44 to 58)". */
export function Interval({ value, low, high, unit, digits = 0, locale }: Props) {
  const words = (number: number) => writtenNumber(number, { digits, locale })
  const range = `${words(low)} to ${words(high)}`
  const unitText = unit ? ` ${unit}` : ''
  if (value === undefined) return <Figure text={`${range}${unitText}`} />
  return (
    <span className="figures">
      {words(value)}
      <span className="unit">
        {unitText} ({range})
      </span>
    </span>
  )
}
