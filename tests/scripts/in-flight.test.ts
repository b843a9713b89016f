import { EventEmitter } from 'node:events'
import type { IncomingMessage, ServerResponse } from 'node:http'
import { expect, test } from 'vitest'
import { InFlight } from '@/scripts/support/in-flight'

function answer() {
  const headers = new Map<string, string>()
  const response = Object.assign(new EventEmitter(), {
    headersSent: false,
    setHeader: (name: string, value: string) => void headers.set(name, value),
  })
  return { headers, response: response as unknown as ServerResponse, done: () => response.emit('close') }
}
const ask = (url: string) => ({ url }) as IncomingMessage

test('turns away what is one too many, and takes it again once one is done', () => {
  const gate = new InFlight(2)
  const [first, second] = [answer(), answer()]
  expect(gate.enter(ask('/w/pier'), first.response)).toBe(true)
  expect(gate.enter(ask('/w/pier'), second.response)).toBe(true)
  expect(gate.enter(ask('/w/pier'), answer().response)).toBe(false)
  first.done()
  expect(gate.enter(ask('/w/pier'), answer().response)).toBe(true)
})

test('never turns away what costs next to nothing', () => {
  const gate = new InFlight(1)
  expect(gate.enter(ask('/'), answer().response)).toBe(true)
  for (const url of ['/api/health', '/_next/static/chunks/a.js?v=1', '/favicon.ico']) {
    expect(gate.enter(ask(url), answer().response)).toBe(true)
  }
  expect(gate.enter(ask('/api/healthy'), answer().response)).toBe(false)
})

test('while it closes, every answer ends its connection, also those begun before', () => {
  const gate = new InFlight(5)
  const [before, after] = [answer(), answer()]
  gate.enter(ask('/'), before.response)
  gate.closeWhenDone()
  gate.enter(ask('/'), after.response)
  expect(before.headers.get('Connection')).toBe('close')
  expect(after.headers.get('Connection')).toBe('close')
})
