import 'server-only'
import type { Transaction } from 'sequelize'
import { env } from '@/lib/config/env'
import { ok } from '@/lib/core/result'
import { remindersOf, type Reminder } from '@/lib/core/promises/reminders'
import { callOffDueOn } from '@/lib/core/states/run-changes'
import { daysBetween } from '@/lib/core/time/day'
import { dayIn } from '@/lib/core/time/zone'
import { inTransaction } from '@/lib/db/in-transaction'
import { paths } from '@/lib/paths'
import { countDeposited } from '@/lib/services/_steps/count-deposited'
import { queueMail } from '@/lib/services/_steps/queue-mail'
import { setReminderDue } from '@/lib/services/_steps/set-reminder-due'
import { Membership, Module, Order, OrderLine, Run, RunOffer, Workshop } from '@/models'
import type { OfferKind } from '@/models/words'

type About = { run: Run; workshop: Workshop; now: Date }

/**
 * Reminds the owners of a run of its decide-by day and of its promises, as long as they stand: not of a decision that is
 * taken, nor of an offer whose last parcel is posted. After a long jump of the clock only the latest reminder of each day goes
 * out.
 * Locks: nothing. Writes: mails, the next due row. Repeat: safe; each reminder is sent once to each owner.
 */
export function remindOwner(cmd: { runId: string; now: Date }) {
  const { runId, now } = cmd
  return inTransaction(async (tx) => {
    const run = await Run.findByPk(runId, { transaction: tx })
    if (run?.state !== 'taking_deposits' && run?.state !== 'locked') return ok({ sent: 0 })
    const workshop = await Workshop.findByPk(run.workshopId, { transaction: tx, rejectOnEmpty: true })
    const offers = await RunOffer.findAll({ where: { runId }, transaction: tx })
    const all = remindersOf({
      decideBy: run.decideByOn,
      postedBy: offers.map(({ kind, postedByOn }) => ({ offer: kind, on: postedByOn })),
    })
    const today = dayIn(now, workshop.timeZone)
    const latest = new Map<string, Reminder<OfferKind>>()
    for (const reminder of all) if (reminder.day <= today) latest.set(topicOf(reminder), reminder)
    let sent = 0
    for (const reminder of latest.values())
      if (await isStanding(tx, run, reminder)) sent += await send(tx, { run, workshop, now }, reminder)
    await setReminderDue(tx, run, workshop.timeZone, all, now)
    return ok({ sent })
  })
}

const topicOf = ({ about, offer }: Reminder) => `${about}.${offer ?? 'run'}`

async function isStanding(tx: Transaction, run: Run, { about, offer }: Reminder): Promise<boolean> {
  if (about === 'decide_by') return run.state === 'taking_deposits'
  if (run.state !== 'locked') return false
  const waiting = await Order.count({
    where: { runId: run.id, state: ['reserved', 'balance_due', 'paid', 'packed'] },
    include: [{ model: OrderLine, as: 'lines', where: { offerKind: offer as OfferKind }, required: true }],
    distinct: true,
    transaction: tx,
  })
  return waiting > 0
}

async function send(tx: Transaction, { run, workshop, now }: About, reminder: Reminder<OfferKind>) {
  const module = await Module.findByPk(run.moduleId, { transaction: tx, rejectOnEmpty: true })
  const owners = await Membership.findAll({
    where: { workshopId: workshop.id, role: 'owner', endedAt: null },
    transaction: tx,
  })
  const isDecision = reminder.about === 'decide_by'
  let sent = 0
  for (const { id, personId } of owners) {
    const isNew = await queueMail(tx, {
      kind: 'owner_reminder',
      workshopId: workshop.id,
      personId,
      subjectId: `${run.id}.${id.slice(0, 13)}.${topicOf(reminder)}`,
      version: daysBetween('1970-01-01', reminder.day),
      props: {
        module: module.name,
        number: run.number,
        about: reminder.about,
        offer: reminder.offer,
        on: reminder.on,
        daysLeft: daysBetween(dayIn(now, workshop.timeZone), reminder.on),
        deposited: isDecision ? await countDeposited(tx, run.id) : 0,
        minimum: run.minimum,
        callsOffOn: isDecision ? callOffDueOn(run.decideByOn) : null,
        runUrl: `${env().BASE_URL}${paths.adminRun(workshop.slug, run.id)}`,
      },
      now,
    })
    if (isNew) sent += 1
  }
  return sent
}
