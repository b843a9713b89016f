import type { Source } from './source'

/** Circles of files that load each other: each as the files on the way round. Types load nothing. */
export function findCycles(sources: readonly Source[]): string[][] {
  const loads = new Map(
    sources.map(({ file, imports }) => [
      file,
      imports.filter((each) => !each.isPackage && !each.isType).map((each) => each.target),
    ]),
  )
  const done = new Set<string>()
  const cycles: string[][] = []
  const way: string[] = []

  function walk(file: string) {
    const met = way.indexOf(file)
    if (met >= 0) {
      cycles.push([...way.slice(met), file])
      return
    }
    if (done.has(file)) return
    way.push(file)
    for (const next of loads.get(file) ?? []) walk(next)
    way.pop()
    done.add(file)
  }

  for (const file of loads.keys()) walk(file)
  return cycles
}
