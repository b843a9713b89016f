/** Nothing here yet: says so, and what to do next. */
export function Empty({ children, action }: { children: React.ReactNode; action?: React.ReactNode }) {
  return (
    <div className="border-quiet border border-dashed px-4 py-6 sm:px-6">
      <div className="max-w-words">{children}</div>
      {action ? <div className="pt-4">{action}</div> : null}
    </div>
  )
}
