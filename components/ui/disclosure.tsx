/** Something most people need not read: a native summary that opens without JavaScript. */
export function Disclosure({
  summary,
  open,
  children,
}: {
  summary: React.ReactNode
  open?: boolean
  children: React.ReactNode
}) {
  return (
    <details open={open} className="text-15">
      <summary className="text-tide bench:min-h-14 inline-flex min-h-11 items-center underline underline-offset-4">
        {summary}
      </summary>
      <div className="pb-2">{children}</div>
    </details>
  )
}
