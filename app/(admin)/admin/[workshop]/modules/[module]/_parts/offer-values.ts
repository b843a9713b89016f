import type { FormState } from '@/components/ui/form-state'
import type { OfferKind } from '@/lib/contracts/fields'
import { formValues } from '@/lib/contracts/form-values'
import type { ModuleDesk } from '@/lib/contracts/module-desk'
import { plainMoney } from '@/lib/core/money/plain'

/** An offer as its form shows it; a new one starts with what most have. */
export function offerForm(
  desk: ModuleDesk,
  kind: OfferKind,
  workshop: { currency: string; country: string },
): FormState {
  const offer = desk.offers.find((each) => each.offer === kind)
  if (!offer) {
    const { country } = workshop
    return { values: { taxClass: 'standard', ageFrom: '14', customsOrigin: country, cautions: '' } }
  }
  const { priceListMinor, ...rest } = offer
  const priceList = priceListMinor.map((price) => plainMoney(price, workshop.currency)).join(', ')
  return { values: formValues({ ...rest, priceList }, workshop.currency) }
}
