/** An address as its label prints it. */
export function AddressLines({ lines, lang }: { lines: readonly string[]; lang?: string }) {
  return (
    <address className="text-17 not-italic" lang={lang}>
      {lines.map((line, index) => (
        <span key={index} className="block">
          {line}
        </span>
      ))}
    </address>
  )
}
