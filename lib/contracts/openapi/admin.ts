import type { z } from 'zod'
import type { Deed } from '@/lib/core/policy/deeds'
import { ChoiceInput, ChoiceRetirement } from '../choice-forms'
import { CostTrial } from '../cost-desk'
import { FileInput, FileRemoval } from '../files'
import * as forms from '../module-forms'
import * as parts from '../part-forms'
import { ImportConfirm, ImportSettings, ImportStart } from '../part-import'
import { PlanInput } from '../plan-forms'
import { CallOffInput, LockInput, LowerMinimumInput, MoveDecideByInput, RunInput } from '../runs'
import { ActualsInput } from '../run-outcome'
import { ClosedDaysInput } from '../schedule'
import * as settings from '../settings'
import { WhatIfInput, WhatIfRemoval } from '../what-ifs'
import type { Operation } from './operation'

const post = (
  path: string,
  summary: string,
  deed: Deed,
  body?: z.ZodType,
  more: { status?: number; answer?: string } = {},
): Operation => ({
  method: 'POST',
  path: `/api/admin/{workshop}${path}`,
  summary,
  deed,
  ...(body && { body }),
  answer: 'what was written',
  ...more,
})
const get = (path: string, summary: string, deed: Deed, answer: string): Operation => ({
  method: 'GET',
  path: `/api/admin/{workshop}${path}`,
  summary,
  deed,
  answer,
})

const module = '/modules/{module}'
const run = '/runs/{run}'

/** What owners call for their workshop and its modules. */
export const WORKSHOP_OPERATIONS: readonly Operation[] = [
  get('', 'The workshop, and what it still needs', 'workshop:read', 'the desk'),
  post(
    '/payment-account',
    'Connect the account at the payment provider',
    'payment_account:connect',
    undefined,
    {
      answer: 'where its forms are',
    },
  ),
  post(
    '/settings/details',
    'Who the workshop is and how it charges tax',
    'settings:write',
    settings.DetailsInput,
  ),
  post('/settings/postage', 'Enter a zone of the post', 'settings:write', settings.PostageInput),
  post('/settings/postage/remove', 'Take a zone away', 'settings:write', settings.ZoneInput),
  post('/settings/terms', 'Publish the next version of the terms', 'terms:write', settings.TermsInput),
  post(
    '/settings/destinations',
    'Open, close or pause a country',
    'destination:write',
    settings.DestinationInput,
  ),
  post('/settings/members', 'Invite somebody to work here', 'member:invite', settings.MemberInput),
  post(
    '/settings/members/withdraw',
    'Withdraw an invitation',
    'member:invite',
    settings.StaffInvitationInput,
  ),
  post('/settings/members/remove', 'End a membership', 'member:remove', settings.MembershipInput),
  post('/modules', 'Enter a module', 'module:create', forms.ModuleNewInput, {
    status: 201,
    answer: '{module}',
  }),
  post(module, 'What a module’s page says', 'module:write', forms.ModuleFactsInput),
  post(`${module}/offers`, 'One form in which it is sold', 'offer:write', forms.OfferInput),
  post(`${module}/revisions`, 'Enter a revision', 'revision:create', forms.RevisionInput),
  post(
    `${module}/first-unit`,
    'A unit of a revision passed everything',
    'revision:prove',
    forms.FirstUnitInput,
  ),
  post(`${module}/lessons`, 'Write down a lesson', 'lesson:write', forms.LessonInput),
  post(`${module}/lessons/mend`, 'Say which revision mends a lesson', 'lesson:mend', forms.MendInput),
  post(`${module}/lessons/waive`, 'Live with a lesson, with a reason', 'lesson:waive', forms.WaiveInput),
  post(`${module}/choices`, 'Ask one more question with an offer', 'choice:write', ChoiceInput),
  post(`${module}/choices/retire`, 'Ask a question no longer', 'choice:write', ChoiceRetirement),
  post(`${module}/files`, 'A picture, a sound or a document', 'file:add', FileInput, {
    status: 201,
    answer: '{file, kind}',
  }),
  post(`${module}/files/remove`, 'Take a file away', 'file:remove', FileRemoval),
  post(`${module}/parts/import`, 'Send a file of parts or quotes', 'part:import', ImportStart, {
    status: 201,
    answer: '{import, revision}',
  }),
  post(`${module}/parts/import/settings`, 'Say how a file is to be read', 'part:import', ImportSettings),
  post(`${module}/parts/import/confirm`, 'Save a file as it was shown', 'part:import', ImportConfirm),
  post(`${module}/parts/quotes`, 'Write down a quote of a part', 'quote:write', parts.QuoteInput),
  post(`${module}/parts/stock`, 'Say how many pieces were counted', 'stock:write', parts.StockInput),
  post(`${module}/parts/alternates`, 'A part that may stand in', 'part:write', parts.AlternateInput),
  post(
    `${module}/parts/alternates/remove`,
    'It may no longer stand in',
    'part:write',
    parts.AlternateRemoval,
  ),
  get(`${module}/interest`, 'Interest, counted, as CSV', 'demand:export', 'text/csv'),
  post(`${module}/parts`, 'Replace a parts list by CSV', 'part:write', forms.PartsInput),
  post(`${module}/samples`, 'Record that a sample was checked', 'part:check_sample', forms.SampleInput),
  post(`${module}/plan`, 'What a run of it costs and takes', 'plan:write', PlanInput),
  post(`${module}/publish`, 'Publish the page', 'module:publish'),
  post(`${module}/archive`, 'Take the page away', 'module:archive'),
]

/** What owners call for their runs. */
export const RUN_OPERATIONS: readonly Operation[] = [
  get('/runs', 'Runs, newest first', 'run:list', '{items: RunListItem[], next}'),
  post('/runs', 'Draft a run', 'run:create', RunInput, { status: 201, answer: '{run}' }),
  get(run, 'A run with its figures and readiness', 'run:read', 'RunView'),
  post(`${run}/open`, 'Open for deposits; confirmed sign-ups are invited', 'run:open_deposits', undefined, {
    answer: '{bulk}',
  }),
  post(`${run}/lock`, 'Lock', 'run:lock', LockInput, { answer: '{bulk}' }),
  post(`${run}/call-off`, 'Call off; everyone is paid back', 'run:call_off', CallOffInput, {
    answer: '{bulk}',
  }),
  post(`${run}/ask-balances`, 'Announce the balances', 'run:ask_balances', undefined, { answer: '{bulk}' }),
  post(`${run}/lower-minimum`, 'Lower the minimum', 'run:lower_minimum', LowerMinimumInput),
  post(`${run}/plan`, 'Save the cost plan of a run', 'cost:write', PlanInput),
  post(`${run}/plan/try`, 'Figures of a plan, nothing saved', 'cost:read', CostTrial, {
    answer: 'CostFigures',
  }),
  post(`${run}/what-ifs`, 'Keep the plan with something different', 'cost:write', WhatIfInput),
  post(`${run}/what-ifs/remove`, 'Throw a what-if away', 'cost:write', WhatIfRemoval),
  post(`${run}/closed-days`, 'Days the workshop does not work', 'schedule:write', ClosedDaysInput),
  post(`${run}/move-decide-by`, 'Move decide-by, once', 'run:move_decide_by', MoveDecideByInput, {
    answer: '{decideBy, bulk}',
  }),
  get(`${run}/demand`, 'Interest in its module, counted, as CSV', 'demand:export', 'text/csv'),
  post(`${run}/actuals`, 'What it really cost and yielded', 'outcome:write', ActualsInput),
  post(`${run}/close`, 'Close a run whose orders are all at an end', 'run:close'),
  get('/bulk/{bulk}', 'How far a bulk job is', 'bulk:read', '{total, done, failed}'),
]
