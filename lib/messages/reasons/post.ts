/** Refusals of the services under packing; each says what to do. */
export const post: Record<string, string> = {
  order_cancelled:
    'This order has been cancelled. Take the parcel apart and put the things back on the shelf.',
  order_not_paid: 'This order is not paid. Leave it; it comes back into the queue once it is.',
  order_disputed:
    'The buyer’s bank has opened a dispute about this order. Set it aside until the owner says that it is settled.',
  destination_paused:
    'Posting to this country is paused at present. Set the parcel aside and take the next one.',
  on_hold: 'This parcel is on hold. Its page says why; take the next one.',
  label_void:
    'The address has changed since the slip was printed. Throw the slip and its label away and print them again, then pack.',
  in_other_batch:
    'Somebody else is packing this order: it is in their batch. Take the next one, or ask the owner to give the batch back.',
  nothing_to_print: 'There is nothing to print here.',
  declaration_incomplete:
    'Customs would send this back: something is missing in the declaration. The page of these papers says what.',
  nothing_to_pack:
    'Nothing in the queue is like this and free to take. Show everything again, or look who has it.',
  nothing_posted: 'Nothing of this order was handed over yet, so there is nothing to report.',
  problem_open: 'You have reported this already. The page says by when you hear.',
  look_first: 'Look at what each line does, then take the list in.',
  not_handed_over: 'This parcel was not handed over yet.',
  no_service: 'No service was quoted for this order. Hand its parcel over by itself and choose one.',
  batch_done: 'This batch is done already.',
  already_packed: 'This parcel is packed already. Open its page to hand it over, or to unpack it.',
  already_handed_over: 'This parcel has been handed over and cannot be changed any more.',
  parcel_discarded: 'This parcel was taken apart. Look in the queue for the order’s new one.',
  not_packed: 'This parcel is not packed yet. Pack it first, then hand it over.',
  weight_surprise:
    'The weight differs from what these things should weigh together. Look for what is missing or too much. If the parcel is right, say so below the weight.',
}
