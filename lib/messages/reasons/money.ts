/** Refusals of the services under orders, payments and refunds. */
export const money: Record<string, string> = {
  run_not_open: 'This run takes no orders now. Its page says where it stands.',
  decide_by_past:
    'The decide-by day has come or passed, so nothing new can begin: the run takes no new orders, and a draft needs a later day.',
  not_open_to_all_yet:
    'People who signed up first may order now; everyone can once the head start is over. The module’s page says when.',
  limit_reached: 'This is more than one person may order in this run. Order fewer.',
  already_ordered:
    'You have a live order in this run to the same address. Open it from your account to pay, change or cancel it.',
  workshop_suspended: 'This workshop takes no payments at the moment. Try again later; nothing was charged.',
  cannot_charge: 'This workshop cannot take payments yet. Try again later; nothing was charged.',
  weights_missing:
    'The workshop has not weighed this offer yet, so its postage is unknown. Ask the workshop to enter it.',
  provider_unreachable: 'The payment provider did not answer. Nothing was changed; try again in a minute.',
  provider_refused:
    'The payment provider would not open a card page. Nothing was charged and no place is held; try again, or ask the workshop.',
  nothing_to_pay: 'There is nothing to pay on this order now. Load the page again to see where it stands.',
  payment_in_flight:
    'A payment of this order is still on its way, and nobody knows yet how it ends. Wait two minutes, then try again.',
  run_locked:
    'The run is locked, so the order can no longer be cancelled with two clicks. The terms on its page say what you can do.',
  disputed:
    'Your bank is looking into a payment of this order. Until it has decided, nothing can be paid back or cancelled here.',
  not_allowed:
    'This is not possible where the order stands now. Load the page again to see what has changed.',
  packed_already:
    'The order is packed, so its address can no longer be changed here. Write to the workshop at once.',
  country_is_settled:
    'The order is paid in full, so its postage and tax are settled. Choose an address in the same country, or write to the workshop.',
  no_place:
    'There are not enough free places for more units, or others wait for them already. Order fewer, or wait until a place is free.',
  nothing_changed: 'Nothing would be different: the order is like this already.',
  withdrawal_over:
    'The 14 days after the last piece arrived are over, so this order can no longer be withdrawn from. Report a problem if something is wrong with it.',
}
