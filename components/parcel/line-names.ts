import type { PackLine } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { papers } from '@/lib/messages/papers'

/** A line in words: `2 × Rowlock, kit`, with its answers behind. */
export function lineName({ quantity, module, offer, choices }: Omit<PackLine, 'line'>): string {
  return [words.each(quantity, module, papers.offers[offer]), ...choices].join('; ')
}
