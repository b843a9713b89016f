/** What is done to many rows of a run, one after another, each once. */
export const BULK_KINDS = [
  'invite',
  'tell_locked',
  'tell_changed',
  'call_off',
  'ask_balances',
  'charge_balances',
] as const
export type BulkKind = (typeof BULK_KINDS)[number]

/**
 * Whether the words typed before a deed are the ones asked for; capitals and spaces do not matter.
 * @example isConfirmedBy(' Lock  Rowlock', 'lock rowlock')  // → true
 */
export function isConfirmedBy(typed: string, words: string): boolean {
  const plain = (text: string) => text.trim().replaceAll(/\s+/g, ' ').toLowerCase()
  return plain(typed) === plain(words)
}
