import { describe, expect, test } from 'vitest'
import { minor } from '@/lib/core/brand'
import { ProviderEffect, ProviderEvent } from '@/models'
import { NOW } from '../support/worlds/base'
import { makeOrder } from '../support/worlds/order'
import { makeAttempt, makeRefund } from '../support/worlds/payment'
import { makeRun } from '../support/worlds/run'
import { refusedBy } from './refused-by'

async function order() {
  const { run, runOffers } = await makeRun()
  return (await makeOrder({ run, lines: [{ offer: runOffers.kit, quantity: 1 }] })).order
}

describe('attempts', () => {
  test('one is alive per order and purpose', async () => {
    const of = await order()
    await makeAttempt(of, { state: 'sent' })
    for (const state of ['requested', 'sent', 'unknown', 'needs_customer'] as const) {
      expect(await refusedBy(() => makeAttempt(of, { state, sequence: 2 }))).toBe(
        'payment_attempts_one_live_key',
      )
    }
    await makeAttempt(of, { state: 'sent', purpose: 'balance' })
  })

  test('after a definite failure the next may begin', async () => {
    const of = await order()
    await makeAttempt(of, { state: 'failed' })
    await makeAttempt(of, { state: 'requested' })
  })

  test('one is captured per order and purpose; a surplus one is marked as going back', async () => {
    const of = await order()
    await makeAttempt(of)
    expect(await refusedBy(() => makeAttempt(of))).toBe('payment_attempts_one_captured_key')
    await makeAttempt(of, { surplusAt: NOW })
  })

  test('a key, and a number within the purpose, is used once', async () => {
    const of = await order()
    const first = await makeAttempt(of, { state: 'failed' })
    const sameNumber = () => makeAttempt(of, { sequence: 1, idempotencyKey: 'another' })
    expect(await refusedBy(sameNumber)).toBe('payment_attempts_order_id_purpose_sequence_key')
    const sameKey = () => makeAttempt(of, { sequence: 2, idempotencyKey: first.idempotencyKey })
    expect(await refusedBy(sameKey)).toBe('payment_attempts_idempotency_key_key')
  })

  test('purposes are deposit, balance and numbered changes', async () => {
    const of = await order()
    await makeAttempt(of, { purpose: 'change-12' })
    for (const purpose of ['change-0', 'change', 'tip', 'deposit ']) {
      expect(await refusedBy(() => makeAttempt(of, { purpose }))).toBe('payment_attempts_purpose_form_check')
    }
  })
})

describe('refunds', () => {
  test('together never exceed what was captured; failed ones do not count', async () => {
    const attempt = await makeAttempt(await order())
    const first = await makeRefund(attempt, { amountMinor: minor(2000) })
    expect(await refusedBy(() => makeRefund(attempt, { amountMinor: minor(501) }))).toBe(
      'refunds_within_captured',
    )
    await first.update({ state: 'failed', failedAt: NOW })
    await makeRefund(attempt, { amountMinor: minor(2500) })
    expect(await refusedBy(() => makeRefund(attempt, { amountMinor: minor(1) }))).toBe(
      'refunds_within_captured',
    )
  })

  test('only of captured payments, in their currency', async () => {
    const attempt = await makeAttempt(await order(), { state: 'sent' })
    expect(await refusedBy(() => makeRefund(attempt))).toBe('refunds_of_captured')
    const captured = await makeAttempt(await order())
    expect(await refusedBy(() => makeRefund(captured, { currency: 'USD' }))).toBe('refunds_of_captured')
  })

  test('ten at once, each of the half: two are accepted', async () => {
    const attempt = await makeAttempt(await order())
    const half = (sequence: number) => makeRefund(attempt, { sequence, amountMinor: minor(1250) })
    const made = await Promise.allSettled(Array.from({ length: 10 }, (_, index) => half(index + 1)))
    expect(made.filter(({ status }) => status === 'fulfilled')).toHaveLength(2)
  })
})

describe('what the provider tells', () => {
  test('is stored once per account and event', async () => {
    const event = {
      account: 'acct_1',
      eventId: 'evt_1',
      type: 'payment',
      objectId: 'pi_1',
      payload: {},
      receivedAt: NOW,
      providerCreatedAt: NOW,
    }
    await ProviderEvent.create(event)
    expect(await refusedBy(() => ProviderEvent.create(event))).toBe('provider_events_account_event_id_key')
    await ProviderEvent.create({ ...event, account: 'acct_2' })
  })

  test('has its effect once per object and transition, whichever event brings it', async () => {
    const effect = { account: 'acct_1', objectId: 'pi_1', transition: 'capture', at: NOW }
    await ProviderEffect.create(effect)
    expect(await refusedBy(() => ProviderEffect.create(effect))).toBe(
      'provider_effects_account_object_id_transition_key',
    )
  })

  test('is cut after a time, and then says so', async () => {
    const event = await ProviderEvent.create({
      account: 'acct_1',
      eventId: 'evt_cut',
      type: 'payment',
      objectId: 'pi_1',
      payload: { name: 'Ines' },
      receivedAt: NOW,
      providerCreatedAt: NOW,
    })
    expect(await refusedBy(() => event.update({ payload: null }))).toBe(
      'provider_events_payload_or_cut_check',
    )
    await event.update({ payload: null, payloadCutAt: NOW })
  })
})
