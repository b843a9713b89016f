const AT_ONCE = 6

/** Does something for each, a few at a time: people do not wait for one another. */
export async function sideBySide<T>(list: readonly T[], act: (item: T) => Promise<void>): Promise<void> {
  const rest = [...list]
  const hand = async () => {
    for (let item = rest.shift(); item !== undefined; item = rest.shift()) await act(item)
  }
  await Promise.all(Array.from({ length: AT_ONCE }, hand))
}
