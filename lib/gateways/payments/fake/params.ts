import 'server-only'
import qs from 'qs'
import { invalid, SandboxBug } from '@/lib/gateways/payments/fake/errors'

type Tree = { [name: string]: Tree | string | undefined }

const OPTIONS = { depth: 10, arrayLimit: 1000, parameterLimit: 10_000 } as const

function paths(tree: Tree, before = ''): string[] {
  return Object.entries(tree).flatMap(([name, value]) => {
    const path = before === '' ? name : `${before}.${name}`
    return typeof value === 'object' && value !== null ? paths(value, path) : [path]
  })
}

/** The parameters of one request by dotted path ('payment_intent_data.metadata.order'); every value is text. */
export class Params {
  readonly #tree: Tree

  constructor(text: string) {
    this.#tree = qs.parse(text, OPTIONS) as Tree
  }

  #at(path: string): Tree | string | undefined {
    let here: Tree | string | undefined = this.#tree
    for (const name of path.split('.')) {
      if (typeof here !== 'object') return undefined
      here = here[name]
    }
    return here
  }

  optional(path: string): string | undefined {
    const value = this.#at(path)
    return typeof value === 'string' ? value : undefined
  }

  text(path: string): string {
    const value = this.optional(path)
    if (value === undefined || value === '')
      throw invalid(`Missing required param: ${path}.`, path, 'parameter_missing')
    return value
  }

  whole(path: string): number {
    const value = this.text(path)
    if (!/^-?\d{1,15}$/.test(value))
      throw invalid(`Invalid integer: ${value}`, path, 'parameter_invalid_integer')
    return Number(value)
  }

  isTrue(path: string): boolean {
    return this.optional(path) === 'true'
  }

  /** A flat map of texts, such as metadata. */
  map(path: string): Record<string, string> {
    const value = this.#at(path)
    if (typeof value !== 'object') return {}
    return Object.fromEntries(
      Object.entries(value).filter((entry): entry is [string, string] => typeof entry[1] === 'string'),
    )
  }

  /** `expand[]`, in whichever way the list was written. */
  list(path: string): string[] {
    return Object.values(this.map(path))
  }

  /** A parameter the fake would silently ignore is a hole in the fake. `known` may end in '.*'. */
  onlyKnown(known: readonly string[]): void {
    for (const path of paths(this.#tree)) {
      const isKnown = known.some((name) =>
        name.endsWith('.*') ? path.startsWith(name.slice(0, -1)) : path === name,
      )
      if (!isKnown) throw new SandboxBug(`the sandbox does not model the parameter ${path}`)
    }
  }
}
