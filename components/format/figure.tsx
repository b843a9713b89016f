/** Written figures with their unit or symbol in a lighter weight; the text itself is left as it was written. */
export function Figure({ text }: { text: string }) {
  const found = /\d(?:[\d.,'’\s]*\d)?/u.exec(text)
  if (!found) return <span className="figures whitespace-nowrap">{text}</span>
  const before = text.slice(0, found.index)
  const after = text.slice(found.index + found[0].length)
  return (
    <span className="figures whitespace-nowrap">
      {before ? <span className={/[-−]/.test(before) ? undefined : 'unit'}>{before}</span> : null}
      {found[0]}
      {after ? <span className="unit">{after}</span> : null}
    </span>
  )
}
