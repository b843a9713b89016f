/** How a card of the sandbox behaves. */
export type CardBehaviour = {
  readonly brand: 'visa' | 'mastercard' | 'amex'
  readonly country: string
  /** When the bank wants the buyer: never, until set up for later charges, on-session only, or each time. */
  readonly authenticates?: 'unless_set_up' | 'on_session' | 'always'
  readonly declines?: {
    readonly code: string
    readonly declineCode: string
    readonly when: 'always' | 'off_session'
  }
  readonly refund?: 'succeeds_later' | 'fails_later'
  readonly disputed?: 'fraudulent' | 'product_not_received'
  /** The money skips the pending balance. */
  readonly isAvailableAtOnce?: boolean
  /** What it does, for the card page. */
  readonly words: string
}

const visa = { brand: 'visa', country: 'US' } as const

function declining(
  code: string,
  declineCode: string,
  words: string,
  when: 'always' | 'off_session' = 'always',
): CardBehaviour {
  return { ...visa, declines: { code, declineCode, when }, words }
}

/**
 * The provider's published test numbers, as far as the fake knows them.
 * Source: the provider's public documentation, "Testing" (numbers from memory).
 */
export const CARDS: Readonly<Record<string, CardBehaviour>> = {
  '4242424242424242': { ...visa, words: 'pays' },
  '5555555555554444': { brand: 'mastercard', country: 'US', words: 'pays' },
  '378282246310005': { brand: 'amex', country: 'US', words: 'pays' },
  '4000002760000016': { ...visa, country: 'DE', words: 'pays, a German card' },
  '4000008260000000': { ...visa, country: 'GB', words: 'pays, a British card' },
  '4000003920000003': { ...visa, country: 'JP', words: 'pays, a Japanese card' },
  '4000000000000077': { ...visa, isAvailableAtOnce: true, words: 'pays, the money is available at once' },
  '4000002500003155': {
    ...visa,
    authenticates: 'unless_set_up',
    words: 'the bank asks the buyer, unless the card was saved before',
  },
  '4000002760003184': { ...visa, authenticates: 'always', words: 'the bank asks the buyer every time' },
  '4000003800000446': {
    ...visa,
    authenticates: 'on_session',
    words: 'the bank asks now, never for later charges',
  },
  '4000008260003178': {
    ...declining(
      'card_declined',
      'insufficient_funds',
      'the bank asks the buyer, then refuses: too little money',
    ),
    authenticates: 'always',
  },
  '4000000000000002': declining('card_declined', 'generic_decline', 'refused'),
  '4000000000009995': declining('card_declined', 'insufficient_funds', 'refused: too little money'),
  '4000000000009987': declining('card_declined', 'lost_card', 'refused: lost'),
  '4000000000009979': declining('card_declined', 'stolen_card', 'refused: stolen'),
  '4000000000000069': declining('expired_card', 'expired_card', 'refused: expired'),
  '4000000000000127': declining('incorrect_cvc', 'incorrect_cvc', 'refused: wrong security code'),
  '4000000000000119': declining('processing_error', 'processing_error', 'refused: error at the bank'),
  '4000000000006975': declining('card_declined', 'card_velocity_exceeded', 'refused: over its limit'),
  '4000000000000341': declining(
    'card_declined',
    'generic_decline',
    'pays now, is refused when charged later',
    'off_session',
  ),
  '4000000000000259': {
    ...visa,
    disputed: 'fraudulent',
    words: 'pays, and is disputed a day later as fraud',
  },
  '4000000000002685': {
    ...visa,
    disputed: 'product_not_received',
    words: 'pays, and is disputed a day later as not received',
  },
  '4000000000007726': { ...visa, refund: 'succeeds_later', words: 'pays; a refund takes a day' },
  '4000000000005126': {
    ...visa,
    refund: 'fails_later',
    words: 'pays; a refund fails a day after it succeeded',
  },
}

/** The digits of a card number as typed. */
export const digitsOf = (typed: string): string => typed.replace(/[\s-]/g, '')

/** How a number behaves; undefined for one that is not published. */
export function cardOf(number: string): CardBehaviour | undefined {
  return CARDS[number]
}

/** The bank’s answer to one try. */
export type Verdict = 'pays' | 'asks' | { readonly code: string; readonly declineCode: string }

/** What the bank says to one try. */
export function verdict(
  card: CardBehaviour,
  {
    offSession,
    isSetUp,
    isAuthenticated,
  }: { offSession: boolean; isSetUp: boolean; isAuthenticated: boolean },
): Verdict {
  if (card.authenticates !== undefined && !isAuthenticated) {
    const asksNow = {
      unless_set_up: !isSetUp,
      on_session: !offSession,
      always: true,
    }[card.authenticates]
    if (asksNow) return 'asks'
  }
  const declines = card.declines
  if (declines && (declines.when === 'always' || offSession)) return declines
  return 'pays'
}
