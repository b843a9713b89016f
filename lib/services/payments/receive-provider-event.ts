import 'server-only'
import { QueryTypes } from 'sequelize'
import { ok } from '@/lib/core/result'
import { crashPoint } from '@/lib/db/crash-point'
import { sequelize } from '@/lib/db/sequelize'
import type { ProviderEvent } from '@/lib/gateways/payments/changes'

/**
 * Stores a verified event under its own id and promises the job that applies it. One statement, since it is the hottest
 * path of a run that opens: the row and its job are there or neither is.
 * Locks: nothing. Writes: one event, one job. Repeat: safe; the second time is answered `isNew: false`.
 */
export async function receiveProviderEvent(event: ProviderEvent, receivedAt: Date) {
  const rows = await sequelize.query(
    `with stored as (
       insert into provider_events (account, event_id, type, object_id, payload, received_at, provider_created_at)
       values ($account, $eventId, $type, $objectId, cast($payload as jsonb), $receivedAt, $happenedAt)
       on conflict (account, event_id) do nothing returning id)
     select graphile_worker.add_job('apply_provider_event', payload => json_build_object('eventId', id)) from stored`,
    {
      bind: {
        account: event.account,
        eventId: event.eventId,
        type: event.type,
        objectId: event.objectId,
        payload: event.raw,
        receivedAt: receivedAt.toISOString(),
        happenedAt: event.happenedAt.toISOString(),
      },
      type: QueryTypes.SELECT,
    },
  )
  crashPoint('event_stored')
  return ok({ isNew: rows.length > 0 })
}
