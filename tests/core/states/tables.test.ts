import { describe, expect, test } from 'vitest'
import { ok, refuse } from '@/lib/core/result'
import { ATTEMPT_MOVES } from '@/lib/core/states/attempt'
import { INVITATION_MOVES } from '@/lib/core/states/invitation'
import { LOT_MOVES } from '@/lib/core/states/lot'
import { MAIL_MOVES } from '@/lib/core/states/mail'
import { MODULE_MOVES } from '@/lib/core/states/module'
import { eventsFrom, movesFrom, next, statesOf, type Move } from '@/lib/core/states/next'
import { ORDER_MOVES } from '@/lib/core/states/order'
import { PARCEL_MOVES } from '@/lib/core/states/parcel'
import { PROBLEM_MOVES } from '@/lib/core/states/problem'
import { PURCHASE_LINE_MOVES } from '@/lib/core/states/purchase-line'
import { REFUND_MOVES } from '@/lib/core/states/refund'
import { REVISION_MOVES } from '@/lib/core/states/revision'
import { RUN_MOVES } from '@/lib/core/states/run'
import { SIGNUP_MOVES } from '@/lib/core/states/signup'
import { UNIT_MOVES } from '@/lib/core/states/unit'
import { WORKSHOP_MOVES } from '@/lib/core/states/workshop'

type Table = readonly Move<string>[]

/** Each table as the design's page of states writes it, `from –event→ to`, and the states that are an end. */
const TABLES: readonly [string, Table, string, string][] = [
  [
    'run',
    RUN_MOVES,
    `-create>draft draft-open_deposits>taking_deposits taking_deposits-lock>locked locked-close>closed
     draft|taking_deposits|locked-call_off>called_off`,
    'closed called_off',
  ],
  [
    'order',
    ORDER_MOVES,
    `-place>awaiting_deposit -queue>waiting waiting-place_offered>awaiting_deposit waiting-leave>cancelled
     awaiting_deposit-deposit_captured>reserved awaiting_deposit-hold_ended>expired awaiting_deposit-cancel>cancelled
     expired-late_capture>reserved reserved-cancel>cancelled reserved-ask_balance>balance_due reserved-nothing_due>paid
     balance_due-balance_captured>paid balance_due-lapse>lapsed lapsed-reinstate>balance_due
     reserved|balance_due|paid-cancel_with_right>cancelled
     waiting|awaiting_deposit|reserved|balance_due|paid|packed-run_called_off>cancelled waiting-run_closed>cancelled
     paid-pack>packed packed-unpack>paid packed-hand_over>posted posted-withdraw>withdrawn
     posted|withdrawn-return_received>returned -enter>paid`,
    'cancelled returned',
  ],
  [
    'sign-up',
    SIGNUP_MOVES,
    '-submit>unconfirmed unconfirmed-confirm>confirmed confirmed-supersede>superseded confirmed-take_back>taken_back',
    'superseded taken_back',
  ],
  [
    'invitation',
    INVITATION_MOVES,
    '-send>sent sent-order>ordered sent-decline>declined sent-end>expired',
    'ordered declined expired',
  ],
  [
    'unit',
    UNIT_MOVES,
    `-start>started started-pass>passed started-fail>rework rework-pass>passed started|rework-scrap>scrapped
     passed-fault_found>rework passed-allocate>allocated allocated-release>passed allocated-hand_over>posted
     posted-return>returned returned-rework>rework returned-scrap>scrapped`,
    'scrapped',
  ],
  [
    'parcel',
    PARCEL_MOVES,
    `-open>open open-pack>packed packed-reopen>open open-discard>discarded packed-hand_over>handed_over
     handed_over-deliver>delivered handed_over-lose>lost handed_over-return>returned lost-find>delivered
     delivered-return>returned`,
    'discarded returned',
  ],
  [
    'purchase line',
    PURCHASE_LINE_MOVES,
    `-plan>planned planned-order>ordered ordered|part_received-receive_some>part_received
     ordered|part_received-receive_all>received ordered|part_received-close_short>received
     planned|ordered-cancel>cancelled`,
    'received cancelled',
  ],
  [
    'lot',
    LOT_MOVES,
    `-receive>received received-accept>accepted received-reject>rejected received-sort>sorted
     rejected-send_back>sent_back rejected-waive>accepted`,
    'accepted sorted sent_back',
  ],
  [
    'attempt',
    ATTEMPT_MOVES,
    `-request>requested requested-send>sent requested|sent-lose_answer>unknown requested|unknown-abandon>abandoned
     sent-abandon>abandoned requested|sent|unknown-capture>captured requested|sent|unknown-needs_customer>needs_customer
     requested|sent|unknown-fail>failed failed|abandoned-capture>captured needs_customer-capture>captured
     needs_customer-fail>failed needs_customer-abandon>abandoned`,
    'captured',
  ],
  [
    'refund',
    REFUND_MOVES,
    `-request>requested requested-send>sent requested|sent-lose_answer>unknown requested|sent|unknown-pend>pending
     requested|sent|unknown|pending-succeed>succeeded requested|sent|unknown|pending|succeeded-fail>failed`,
    'failed',
  ],
  [
    'mail',
    MAIL_MOVES,
    `-queue>queued queued-claim>sending sending-accept>sent sending-defer>queued sending-give_up>given_up
     queued-drop>dropped sent-bounce>bounced`,
    'given_up dropped bounced',
  ],
  [
    'problem',
    PROBLEM_MOVES,
    '-open>open open-answer>answered answered-reopen>open answered-close>closed closed-reopen>open',
    '',
  ],
  [
    'module',
    MODULE_MOVES,
    '-create>draft draft-publish>published published-archive>archived archived-publish>published',
    '',
  ],
  [
    'revision',
    REVISION_MOVES,
    '-create>draft draft-test>testing testing-prove>proven draft|testing|proven-supersede>superseded',
    'superseded',
  ],
  [
    'workshop',
    WORKSHOP_MOVES,
    '-start>pending pending-open>open open-suspend>suspended suspended-reopen>open',
    '',
  ],
]

function read(text: string): Set<string> {
  return new Set(
    text
      .split(/\s+/)
      .filter(Boolean)
      .flatMap((move) => {
        const [, from = '', rest = ''] = /^([^-]*)-(.*)$/.exec(move) ?? []
        return from.split('|').map((each) => `${each}-${rest}`)
      }),
  )
}

const written = (moves: Table) => moves.map(({ from, event, to }) => `${from ?? ''}-${event}>${to}`)

describe.each(TABLES)('%s', (_, moves, page, ends) => {
  const states = statesOf(moves)

  test('has the moves of the page, each once', () => {
    expect(written(moves).toSorted()).toEqual([...read(page)].toSorted())
  })

  test('has no dead end but its ends', () => {
    expect(states.filter((state) => eventsFrom(moves, state).length === 0).toSorted()).toEqual(
      ends.split(' ').filter(Boolean).toSorted(),
    )
  })

  test('has no state that cannot be reached from creation', () => {
    const reached = new Set<string>()
    const queue = moves.filter((move) => move.from === null).map((move) => move.to)
    for (let state = queue.pop(); state !== undefined; state = queue.pop()) {
      if (reached.has(state)) continue
      reached.add(state)
      queue.push(...moves.filter((move) => move.from === state).map((move) => move.to))
    }
    expect([...reached].toSorted()).toEqual(states.toSorted())
  })

  test('leads from a state by an event to one state only', () => {
    const asked = moves.map(({ from, event }) => `${from} ${event}`)
    expect(new Set(asked).size).toBe(asked.length)
  })

  test('next allows exactly its moves', () => {
    const events = [...new Set(moves.map((move) => move.event))]
    for (const state of [null, ...states]) {
      for (const event of events) {
        const move = moves.find((each) => each.from === state && each.event === event)
        expect(next(moves, state, event)).toEqual(move ? ok(move.to) : refuse('not_allowed'))
      }
      expect(next(moves, state, 'sing')).toEqual(refuse('not_allowed'))
    }
  })
})

describe('what the order table must not allow', () => {
  test.each([
    ['posted', 'run_called_off'],
    ['posted', 'cancel'],
    ['packed', 'cancel_with_right'],
    ['cancelled', 'late_capture'],
    ['lapsed', 'balance_captured'],
    ['expired', 'deposit_captured'],
    ['balance_due', 'pack'],
    ['reserved', 'pack'],
  ] as const)('%s –%s→', (state, event) => {
    expect(next(ORDER_MOVES, state, event)).toEqual(refuse('not_allowed'))
  })
})

test('movesFrom repeats a move for each state', () => {
  expect(movesFrom(['a', 'b'], 'end', 'c')).toEqual([
    { from: 'a', event: 'end', to: 'c' },
    { from: 'b', event: 'end', to: 'c' },
  ])
})
