/** Two columns at most, one under the other where it is narrow; the first is the wider. */
export function Columns({ children }: { children: React.ReactNode }) {
  return <div className="grid gap-6 md:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">{children}</div>
}

/** Things one under the other, with room between them. */
export function Stack({ children, gap = 'wide' }: { children: React.ReactNode; gap?: 'wide' | 'narrow' }) {
  return <div className={gap === 'wide' ? 'flex flex-col gap-6' : 'flex flex-col gap-3'}>{children}</div>
}

/** Running text, 70 characters wide at most. */
export function Words({ children }: { children: React.ReactNode }) {
  return (
    <div className="max-w-words text-17 [&_h2]:text-21 [&_h3]:text-17 flex flex-col gap-3 [&_h2]:pt-3 [&_h3]:pt-2 [&_li]:ml-5 [&_ol]:list-decimal [&_ul]:list-disc">
      {children}
    </div>
  )
}
