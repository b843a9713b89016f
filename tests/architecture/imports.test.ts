import { describe, expect, test } from 'vitest'
import { ARROWS, coreRank, isStep } from './arrows'
import { findCycles } from './cycles'
import { partOf, readSources, type Import, type Source } from './source'

const sources = readSources()
const inParts = sources.filter((source) => source.part !== null)

/** Why this import may not be; null when it may. */
function wrongWay({ file, part }: Source, { target, isPackage, isType }: Import): string | null {
  const arrows = ARROWS[part ?? '']
  if (!arrows) return null
  if (isPackage) {
    const isAllowed =
      isType || target === 'server-only' || (arrows.packages ?? []).some((name) => name.test(target))
    return isAllowed ? null : `${file} → package ${target}`
  }
  const to = partOf(target)
  const isBetweenServices = part?.startsWith('lib/services') && target.startsWith('lib/services/')
  if (isBetweenServices && !isType && !isStep(target)) return `${file} → another service, ${target}`
  if (to === part) {
    if (part === 'lib/core' && coreRank(target) > coreRank(file)) return `${file} → higher in core, ${target}`
    return null
  }
  const allowed = [...arrows.may, ...(isType ? (arrows.types ?? []) : [])]
  const may = allowed.some((name) => to === name || target.startsWith(`${name}/`) || target === `${name}.ts`)
  return may ? null : `${file} → ${target}`
}

test('the sources were found', () => {
  expect(inParts.length).toBeGreaterThan(100)
  expect(inParts.flatMap(({ imports }) => imports).length).toBeGreaterThan(200)
})

test('imports go the way of the table', () => {
  const wrong = inParts.flatMap((source) => source.imports.map((each) => wrongWay(source, each)))
  expect(wrong.filter((each) => each !== null)).toEqual([])
})

test('every file imported is there', () => {
  const files = new Set(sources.map(({ file }) => file))
  const missing = sources.flatMap(({ file, imports }) =>
    imports
      .filter(
        ({ target, isPackage }) =>
          !isPackage && !files.has(target) && !/\.(mjs|mts|json|css|woff2)$/.test(target),
      )
      .map(({ target }) => `${file} → ${target}`),
  )
  expect(missing).toEqual([])
})

test('no files load each other in a circle', () => {
  expect(findCycles(inParts).map((cycle) => cycle.join(' → '))).toEqual([])
})

describe('what stays on the server says so', () => {
  const MARKED = ['lib/queries', 'lib/services', 'lib/gateways', 'lib/jobs', 'lib/tasks']
  const HARMLESS = ['lib/core', 'lib/contracts', 'lib/messages', 'lib/paths']
  const reachesOut = ({ part, imports }: Source) =>
    imports.some(({ target, isPackage, isType }) => {
      if (isType || target === 'server-only') return false
      return isPackage
        ? target !== 'zod'
        : partOf(target) !== part && !HARMLESS.includes(partOf(target) ?? '')
    })

  test('with its first import', () => {
    const unmarked = inParts
      .filter((source) => MARKED.some((part) => source.part?.startsWith(part)) && reachesOut(source))
      .filter(({ imports }) => imports[0]?.target !== 'server-only')
    expect(unmarked.map(({ file }) => file)).toEqual([])
  })
})

test('the table itself is enforced: each kind of wrong import is seen', () => {
  const from = (file: string, target: string, isType = false) =>
    wrongWay(
      { file, text: '', part: partOf(file), imports: [] },
      { target, isPackage: !target.includes('/'), isType },
    )
  expect(from('lib/core/money/divide.ts', 'models/order.ts')).toContain('→')
  expect(from('lib/core/money/divide.ts', 'lib/core/policy/can.ts')).toContain('higher in core')
  expect(from('lib/core/money/divide.ts', 'zod')).toContain('package zod')
  expect(from('lib/services/runs/lock-run.ts', 'lib/services/runs/close-run.ts')).toContain('another service')
  expect(from('lib/services/runs/lock-run.ts', 'lib/services/_steps/record-move.ts')).toBeNull()
  expect(from('app/account/page.tsx', 'models/index.ts')).toContain('→')
  expect(from('app/account/page.tsx', 'stripe')).toContain('package stripe')
  expect(from('components/ui/button.tsx', 'lib/services/runs/lock-run.ts')).toContain('→')
  expect(from('models/order.ts', 'lib/contracts/orders.ts')).toContain('→')
  expect(from('models/order.ts', 'lib/contracts/orders.ts', true)).toBeNull()
  expect(from('lib/auth/actor.ts', 'lib/gateways/payments/index.ts')).toContain('→')
  expect(from('lib/auth/actor.ts', 'lib/gateways/clock.ts')).toBeNull()
})
