import type { Maker } from '@/lib/contracts/module-page'
import { formatAddress } from '@/lib/core/post/address'
import type { Workshop } from '@/models'

/** Who sells, as the law wants it known; the address as it stands on a letter from abroad. */
export function toMaker(workshop: Workshop): Maker {
  const { slug, name, legalName, postalAddress, replyTo, phone, taxNumber, about } = workshop
  return {
    slug,
    name,
    legalName,
    address: postalAddress ? formatAddress(postalAddress, { script: 'own', from: '' }) : [],
    replyTo,
    phone,
    taxNumber,
    about,
  }
}
