type Fact = { key?: string; name: React.ReactNode; value: React.ReactNode; kind?: 'text' | 'figures' }

/** Names and values, ruled; values of kind 'figures' stand on a common right edge. */
export function Facts({ facts }: { facts: readonly Fact[] }) {
  return (
    <dl className="border-rule text-15 border-t">
      {facts.map((fact, index) => (
        <div
          key={fact.key ?? index}
          className={`border-rule border-b py-2 ${fact.kind === 'figures' ? 'flex flex-wrap items-baseline justify-between gap-x-6' : 'grid grid-cols-[7.5rem_minmax(0,1fr)] gap-x-4'}`}
        >
          <dt className="text-quiet">{fact.name}</dt>
          <dd className={fact.kind === 'figures' ? 'grow text-right' : 'min-w-0'}>{fact.value}</dd>
        </div>
      ))}
    </dl>
  )
}
