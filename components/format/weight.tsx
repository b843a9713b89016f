import { writtenWeight } from '@/lib/messages/written'
import { Figure } from './figure'

/** A weight in grams, from a kilogram on in kilograms. */
export function Weight({ grams, locale }: { grams: number; locale?: string }) {
  return <Figure text={writtenWeight(grams, { locale })} />
}
