type Props = {
  title: React.ReactNode
  /** Where this page hangs, above its title: links outwards. */
  trail?: readonly { href: string; label: React.ReactNode }[]
  /** One line under the title. */
  lead?: React.ReactNode
  /** Right of the title: a state, a button. */
  aside?: React.ReactNode
}

/** The top of a page: where it hangs, its one h1, a line that says what it is for. */
export function PageHead({ title, trail = [], lead, aside }: Props) {
  return (
    <div className="pb-6">
      {trail.length > 0 ? (
        <ol className="text-13 flex flex-wrap gap-x-2">
          {trail.map((link) => (
            <li key={link.href} className="after:text-quiet after:pl-2 after:content-['/']">
              <a href={link.href} className="inline-flex min-h-6 items-center">
                {link.label}
              </a>
            </li>
          ))}
        </ol>
      ) : null}
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 gap-y-2">
        <h1 className="text-28 sm:text-40">{title}</h1>
        {aside}
      </div>
      {lead ? <p className="max-w-words text-17 text-quiet pt-1">{lead}</p> : null}
    </div>
  )
}
