import 'server-only'
import { CARDS } from '@/lib/gateways/payments/fake/cards'

/** The published test card numbers the sandbox knows, and what each does. */
export const listCards = (): { number: string; words: string }[] =>
  Object.entries(CARDS).map(([number, { words }]) => ({
    number: number.replaceAll(/(.{4})(?=.)/g, '$1 '),
    words,
  }))
