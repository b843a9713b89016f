import 'server-only'
import { noteForecast } from '@/lib/services/runs/note-forecast'
import { remindOwner } from '@/lib/services/runs/remind-owner'
import { sendOwnerDigest } from '@/lib/services/today/send-owner-digest'
import type { DueHandler } from './due-kinds'

export const runForecast: DueHandler = async ({ subjectId }, now) =>
  void (await noteForecast({ runId: subjectId, now }))

export const runReminder: DueHandler = async ({ subjectId }, now) =>
  void (await remindOwner({ runId: subjectId, now }))

export const ownerDigest: DueHandler = async ({ subjectId }, now) =>
  void (await sendOwnerDigest({ workshopId: subjectId, now }))
