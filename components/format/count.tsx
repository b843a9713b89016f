import { plural, type PluralForms } from '@/lib/messages/plural'
import { writtenNumber } from '@/lib/messages/written'
import { Figure } from './figure'

type Props = { value: number; forms?: PluralForms; locale?: string }

/** A counted number, alone or with the word its count asks for. */
export function Count({ value, forms, locale }: Props) {
  if (!forms) return <Figure text={writtenNumber(value, { locale })} />
  return <span>{plural(value, forms, locale)}</span>
}
