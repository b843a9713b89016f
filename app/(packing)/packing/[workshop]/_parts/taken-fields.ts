import type { QueueQuery } from '@/lib/contracts/packing'

/** The filter of the queue as fields of a form that takes from it. */
export function takenFields({ offer, country, choice, service, group }: QueueQuery): Record<string, string> {
  const fields = Object.entries({ offer, country, choice, service, group })
  return Object.fromEntries(fields.filter((field): field is [string, string] => field[1] !== undefined))
}
