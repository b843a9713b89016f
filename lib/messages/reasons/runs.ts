/** Refusals of the services under runs: opening, locking, calling off, balances. */
export const runs: Record<string, string> = {
  not_allowed: 'This is not possible in the present state. Load the page again to see what has changed.',
  workshop_not_open:
    'The workshop is not open. The host of this site opens it; until then you can draft and preview.',
  another_run_open:
    'Another run of this module takes deposits already. Lock it or call it off before opening the next.',
  minimum_out_of_range: 'The minimum must be a whole number from 1 up to the maximum.',
  decide_by_past:
    'The decide-by day has come or passed: nothing new can begin. Draft the run again with a later day.',
  no_offer: 'The run sells nothing yet. Draft it again with at least one offer.',
  offer_without_date: 'One of the offers has no posted-by date. Draft the run again with one.',
  posted_by_before_decide_by:
    'A posted-by date lies before the decide-by day. Draft the run again with a later one.',
  offer_without_price: 'One of the offers has no price. Draft the run again with one.',
  deposit_out_of_range: 'A deposit must be above zero and at most the price. Draft the run again.',
  amount_not_chargeable:
    'The payment provider cannot charge one of these sums. Draft the run again with other sums.',
  account_cannot_charge:
    'Your payment account cannot take cards yet. Finish the provider’s forms under Payment account, then open the run.',
  page_not_published: 'The module’s page is not published. Publish it first, then open the run.',
  terms_missing: 'Your terms are not published. Publish them under Settings, then open the run.',
  beyond_holding_limit:
    'The decide-by day lies beyond the time the provider keeps deposits in your balance. Choose an earlier day, or say in the draft how deposits are kept until then.',
  below_minimum:
    'The minimum is not reached. Write down why the run goes ahead all the same; buyers read it. Or wait.',
  not_ready:
    'A line of the readiness list is not ready. Mend it, or write down why you let it pass; nothing was locked.',
  session_open: 'Somebody is paying a deposit right now. Try again in a minute.',
  attempt_unknown:
    'The payment provider has not said what became of a payment. Try again in a few minutes; nothing was changed.',
  reason_missing: 'Write down why; buyers will read it.',
  already_handed_over:
    'Something of this run is in the post already, so it can no longer be called off. Cancel single orders instead.',
  not_taking_deposits: 'This run does not take deposits at present.',
  already_moved: 'Decide-by has been moved before, and it moves only once. Decide, or call the run off.',
  not_later: 'Choose a day after the present decide-by day.',
  too_far: 'Decide-by moves by at most 30 days. Choose an earlier day.',
  not_lower: 'The minimum can only fall: buyers counted on it.',
  nothing_built: 'Nothing of this run has been built: it is not locked.',
  run_not_locked: 'Balances can be asked for once the run is locked.',
  nothing_to_ask: 'Every balance of this run has been announced already.',
  order_short_of_end: 'Some orders are not posted yet. Close the run when the last one is.',
  problem_open: 'A buyer’s problem is still open. Answer and close it first.',
  refund_pending: 'A refund is still on its way. Close the run when it has arrived.',
  no_plan: 'This run has no plan of its own yet. Save one under Costs first.',
  too_many_what_ifs: 'Three what-ifs stand beside the plan already. Remove one first.',
  run_ended: 'This run has ended; its plan is kept as it was.',
  conversions_missing: 'What became of the sign-ups could not be stored. Try again.',
}
