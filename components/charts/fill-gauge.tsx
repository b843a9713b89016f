import { Disclosure } from '@/components/ui/disclosure'
import { Facts } from '@/components/ui/facts'
import { charts } from '@/lib/messages/charts'
import { ui } from '@/lib/messages/ui'
import { writtenNumber } from '@/lib/messages/written'
import { GaugeTube, type GaugeLevels } from './gauge-tube'

type Props = GaugeLevels & {
  size?: 'small' | 'medium' | 'large'
  daysLeft?: number
  /** The decide-by day. */
  decideBy?: string
}

/**
 * How full a run is. Without `forecast` it shows counts only and may stand in public; the forecast is the owner's.
 * Small: for a row of a table. Medium: beside text. Large: with its scale named and the figures as a table.
 */
export function FillGauge({ size = 'medium', daysLeft, decideBy, ...levels }: Props) {
  const { deposited, minimum, maximum, forecast } = levels
  const sentence = charts.gauge({ deposited, minimum, maximum, daysLeft, decideBy })
  if (size === 'small')
    return (
      <span className="inline-flex items-center gap-2">
        <GaugeTube size="small" {...levels} />
        <span className="text-15">{sentence}</span>
      </span>
    )
  const large = size === 'large'
  return (
    <figure className="flex flex-wrap items-center gap-x-6 gap-y-3">
      <GaugeTube size={size} {...levels} />
      <figcaption className={`min-w-0 grow basis-52 pb-2 ${large ? 'text-21' : 'text-17'}`}>
        <p className="max-w-words">{sentence}</p>
        {forecast ? (
          <p className="max-w-words text-15 text-quiet pt-1">{charts.gaugeForecast(forecast)}</p>
        ) : null}
        {large ? (
          <Disclosure summary={ui.inTable}>
            <Facts facts={factsOf(levels, daysLeft)} />
          </Disclosure>
        ) : null}
      </figcaption>
    </figure>
  )
}

function factsOf({ deposited, minimum, maximum, forecast }: GaugeLevels, daysLeft: number | undefined) {
  const figure = (name: string, value: string) => ({ name, value, kind: 'figures' as const })
  return [
    figure(charts.underDeposit, writtenNumber(deposited)),
    ...(forecast
      ? [
          figure(charts.expected, writtenNumber(Math.max(0, Math.round(forecast.mean) - deposited))),
          figure(charts.range80, charts.rangeWords(forecast.low, forecast.high)),
        ]
      : []),
    figure(charts.minimum, writtenNumber(minimum)),
    figure(charts.maximum, writtenNumber(maximum)),
    ...(daysLeft === undefined ? [] : [figure(charts.daysLeft, writtenNumber(Math.max(0, daysLeft)))]),
  ]
}
