/** Something that takes up to a maximum of units; `maximum` null: no limit of its own. */
export type Room = { readonly id: string; readonly maximum: number | null; readonly committedUnits: number }

/**
 * Units of a run neither taken nor held for these lines: none when an offer's own maximum leaves too few for its line.
 * Units:   whole units.
 * Domain:  any; lines of offers that are not given are not limited by them.
 * @example freeUnits({ maximum: 5, committedUnits: 3 }, [], [])  // → 2
 * @example freeUnits({ maximum: 5, committedUnits: 3 }, [{ id: 'kit', maximum: 3, committedUnits: 3 }], [{ runOfferId: 'kit', quantity: 1 }])  // → 0
 */
export function freeUnits(
  run: { readonly maximum: number; readonly committedUnits: number },
  offers: readonly Room[],
  lines: readonly { readonly runOfferId: string; readonly quantity: number }[],
): number {
  const isOver = lines.some(({ runOfferId, quantity }) => {
    const offer = offers.find(({ id }) => id === runOfferId)
    return offer !== undefined && offer.maximum !== null && offer.committedUnits + quantity > offer.maximum
  })
  return isOver ? 0 : run.maximum - run.committedUnits
}
