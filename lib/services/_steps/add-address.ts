import 'server-only'
import type { Transaction } from 'sequelize'
import type { AddressInput } from '@/lib/contracts/address'
import { addressFingerprint } from '@/lib/services/_steps/address-fingerprint'
import { Address } from '@/models'

/** Writes an address down; addresses are only ever added. Locks: nothing. Writes: one row. Repeat: adds another. */
export async function addAddress(
  tx: Transaction,
  given: { workshopId: string; personId: string; address: AddressInput; now: Date },
): Promise<Address> {
  const { workshopId, personId, address, now } = given
  return Address.create(
    {
      workshopId,
      personId,
      country: address.country,
      name: address.name,
      organization: address.organization ?? null,
      lines: address.lines,
      city: address.city ?? null,
      region: address.region ?? null,
      postcode: address.postcode ?? null,
      phone: address.phone ?? null,
      taxNumber: address.taxNumber ?? null,
      latin: address.latin ?? null,
      fingerprint: addressFingerprint(address),
      createdAt: now,
    },
    { transaction: tx },
  )
}
