/**
 * Words that say nothing of what a thing is: a description made of these alone is refused by customs.
 * Source: the kind of terms the EU's import control system lists as not acceptable ("electronics", "parts", "gift",
 * "sample", "accessories" …), from memory; kept by hand.
 */
const VAGUE_WORDS = new Set(
  (
    'a an and article articles accessories accessory all assorted bits boards board component components content contents ' +
    'device devices diy electrical electronic electronics equipment for from gear gift gifts good goods hardware hobby in item ' +
    'items kit kits machine machinery material materials merchandise misc miscellaneous module modules new of order other others ' +
    'pack package parcel part parts personal piece pieces present presents private product products project sale sample samples ' +
    'set sets small some spare spares stuff supplies supply the thing things toy toys unit units various with works'
  ).split(' '),
)

/**
 * Whether a description names nothing: every word of it could stand on any parcel.
 * @example  isVague('Electronic parts')  // → true
 * @example  isVague('Audio mixer, kit of parts')  // → false
 */
export function isVague(description: string): boolean {
  const words = description.toLowerCase().match(/\p{L}+/gu) ?? []
  return words.every((word) => VAGUE_WORDS.has(word))
}
