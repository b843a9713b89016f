import { writtenPercent } from '@/lib/messages/written'
import { Figure } from './figure'

type Props = ({ ratio: number } | { basisPoints: number }) & { digits?: number; locale?: string }

/** A share in per cent, from a ratio or from basis points. */
export function Percent({ digits, locale, ...share }: Props) {
  const ratio = 'ratio' in share ? share.ratio : share.basisPoints / 10_000
  return <Figure text={writtenPercent(ratio, { digits, locale })} />
}
