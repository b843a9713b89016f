import type { PackLine } from '@/lib/contracts/packing'
import { lineName } from './line-names'

/** What is in a parcel, a line each. */
export function Contents({ lines }: { lines: readonly PackLine[] }) {
  return (
    <ul>
      {lines.map((line) => (
        <li key={line.line}>{lineName(line)}</li>
      ))}
    </ul>
  )
}
