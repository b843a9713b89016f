import { parseMoney } from '@/lib/core/money/parse'

type Tree = { [name: string]: unknown }

const amountWords = {
  not_a_number: 'Enter an amount, such as 25.00.',
  too_precise: 'Enter an amount without more decimals than the currency has.',
  too_large: 'This amount is too large.',
}

/**
 * Turns a posted form into the body a contract reads: dotted names become objects and lists
 * ('offers.0.priceMinor'), and, when the form names its `currency`, each field ending in `Minor` is an amount
 * as people write it and becomes minor units. The same function serves the handler and the browser.
 * Returns the body and a sentence for each amount that cannot be read.
 */
export function fieldsToBody(fields: Iterable<readonly [string, string]>): {
  body: Tree
  errors: Record<string, string>
} {
  const pairs = [...fields]
  const currency = pairs.find(([name]) => name === 'currency')?.[1]
  const body: Tree = {}
  const errors: Record<string, string> = {}
  for (const [name, typed] of pairs) {
    const isAmount = currency !== undefined && name.endsWith('Minor') && typed.trim() !== ''
    if (!isAmount) {
      place(body, name, typed)
      continue
    }
    const amount = parseMoney(typed.trim(), currency)
    if (amount.ok) place(body, name, amount.value)
    else errors[name] = amountWords[amount.reason]
    if (!amount.ok) place(body, name, typed)
  }
  return { body: listed(body) as Tree, errors }
}

function place(body: Tree, name: string, value: unknown): void {
  const steps = name.split('.').slice(0, 6)
  if (steps.some((step) => step === '__proto__' || step === 'constructor' || step === 'prototype')) return
  let here = body
  for (const step of steps.slice(0, -1)) {
    const next = here[step]
    here = typeof next === 'object' && next !== null ? (next as Tree) : ((here[step] = {}) as Tree)
  }
  const last = steps.at(-1)!
  if (last.endsWith('[]')) {
    const list = (here[last.slice(0, -2)] ??= []) as unknown[]
    if (Array.isArray(list)) list.push(value)
  } else here[last] = value
}

/** Objects whose names are 0, 1, 2 … become lists; gaps close, so that a removed row leaves no hole. */
function listed(value: unknown): unknown {
  if (Array.isArray(value) || typeof value !== 'object' || value === null) return value
  const names = Object.keys(value)
  const entries = names.map((name) => [name, listed((value as Tree)[name])] as const)
  if (names.length > 0 && names.every((name) => /^\d{1,4}$/.test(name)))
    return entries.sort(([a], [b]) => Number(a) - Number(b)).map(([, each]) => each)
  return Object.fromEntries(entries)
}
