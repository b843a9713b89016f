import { plural } from './plural'
import { writtenWeight } from './written'

const orders = (count: number) => plural(count, { one: '# order', other: '# orders' })

/** Mistakes at the fields of packing and handing over. */
export const packingMistakes = {
  foreignLine: 'This line does not belong to this parcel. Take it out.',
  lineTwice: 'This line is named twice. Name it once.',
  lineMissing: (names: readonly string[]) => `Not ticked yet: ${names.join('; ')}. Put it in, then tick it.`,
  quantityIs: (quantity: number) => `${quantity} of this belong in the parcel. Count again.`,
  serialCount: (quantity: number) =>
    plural(quantity, {
      one: 'Enter one serial number, or none.',
      other: 'Enter # serial numbers, one for each piece, or none.',
    }),
  serialUnknown: (serial: string) =>
    `There is no unit ${serial} of this run in this form. Look at its label again.`,
  serialElsewhere: (serial: string) => `Unit ${serial} belongs to another order. Take a different one.`,
  serialNotPassed: (serial: string) => `Unit ${serial} has not passed its test plan. Take a different one.`,
  serialTwice: (serial: string) => `Unit ${serial} is named twice. Scan the other one.`,
  serviceElsewhere: 'This service does not go to this country. Choose another one.',
  tooHeavy: (service: string, most: number, grams: number) =>
    `${service} takes at most ${writtenWeight(most)}; this parcel weighs ${writtenWeight(grams)}. Choose another service.`,
  tooLarge: (service: string, most: number) =>
    `${service} takes at most ${most} mm on the longest side. Choose another service.`,
  tracking: {
    check_digit:
      'One digit of this number is mistyped: its check digit does not match. Scan or type it again.',
    characters: 'Use letters, digits and hyphens, as printed on the label.',
    length: 'Use at most 40 characters.',
  },
  notAPacker: 'Choose somebody who packs in this workshop.',
  trackingTaken: (parcel: number) =>
    `This number stands on parcel ${parcel} already. Scan the label of this one.`,
}

/** The packer's pages. */
export const packingWords = {
  title: 'Packing',
  nav: {
    post: 'Post',
    queue: 'Queue',
    packed: 'Packed',
    posted: 'Posted',
    papers: 'Papers',
    desk: 'Workshop’s desk',
  },
  queueLead: (count: number) =>
    count === 0 ? 'Nothing waits to be packed.' : `${orders(count)} can be packed now, oldest promise first.`,
  tabs: 'Parcels',
  tab: { queue: 'To pack', packed: 'Packed', handed_over: 'Posted' },
  table: {
    queue: 'Parcels to pack, oldest promise first',
    packed: 'Packed parcels, waiting to be handed over',
    handed_over: 'Parcels handed over, newest first',
  },
  order: 'Order',
  to: 'To',
  contents: 'Contents',
  postedBy: 'Promised by',
  parcel: 'Parcel',
  weight: 'Weight',
  service: 'Service',
  tracking: 'Tracking',
  when: 'Handed over',
  pack: 'Pack',
  handOver: 'Hand over',
  look: 'Look',
  empty: {
    queue: 'Nothing waits to be packed. An order comes here by itself once it is paid.',
    filtered: 'Nothing in the queue is like this. Show everything again.',
    packed: 'Nothing is packed. Take the first parcel of the queue.',
    handed_over: 'Nothing was handed over yet.',
  },
  filter: {
    offer: 'Offer',
    country: 'Country',
    choice: 'Choice',
    service: 'Service',
    all: 'All',
    apply: 'Show',
    clear: 'Show everything',
  },
  take: {
    title: 'Take a batch',
    hint: 'What you take is yours to pack: nobody else gets it, until you give it back.',
    most: 'Orders at most',
    packer: 'For',
    me: 'Myself',
    button: 'Take the oldest promises',
    these: (count: number) => `Take ${orders(count)} like this`,
  },
  groups: {
    caption: 'Orders of the same contents, free to take',
    contents: 'Contents',
    count: 'Orders',
    show: 'Show',
    empty: 'No order is free to take: what waits is in a batch.',
  },
  batches: {
    caption: 'Batches',
    name: 'Batch',
    packer: 'Packed by',
    progress: 'Packed and posted',
    of: (packed: number, posted: number, total: number) =>
      `${packed + posted} packed, ${posted} posted, of ${total}`,
    open: 'Open it',
  },
  batch: {
    name: (number: number) => `Batch ${number}`,
    somebody: 'somebody else',
    lead: (packer: string, isMine: boolean) =>
      isMine ? 'You pack this batch.' : `${packer} packs this batch.`,
    packed: 'Packed',
    posted: 'Posted',
    back: 'Give back what is not packed',
    backHint: 'It goes into the queue again, for anybody.',
    allPosted: 'Everything of this batch is with the post',
    allPostedWords: (count: number) =>
      `${orders(count)} handed over; each buyer has had their mail. Take the next batch, or stop for today.`,
    closed: 'This batch is closed.',
    next: 'Pack the next one',
    handOver: (count: number) =>
      `Hand over ${plural(count, { one: '# packed parcel', other: '# packed parcels' })}: tell the buyers`,
    handOverHint:
      'Each goes by the service its buyer was quoted. Print the hand-over list first; after this nothing can be undone here.',
    toQueue: 'To the queue',
    contains: 'Still to pack, oldest promise first',
    nothingLeft: 'Everything of this batch is packed. Hand it over below.',
  },
  allPosted: 'Nothing is left',
  allPostedWords: 'Every paid order is packed and with the post. New ones come here by themselves.',
  hold: {
    title: 'Set aside',
    reason: 'Why it waits',
    hint: 'Whoever packs next reads this. It leaves the batch it is in.',
    button: 'Put on hold',
    release: 'Let it go on',
  },
  otherPacker: (packer: string) => `${packer} packs it.`,
  scan: {
    label: 'Order number',
    hint: 'Scan the bar code of a slip or list, or type the number.',
    find: 'Open',
    none: (number: string) =>
      `There is no parcel of order ${number}. Check the number, or take one from the queue.`,
  },
  progress: (module: string, run: number) => `${module}, run ${run}: orders posted`,
  stopped: {
    title: 'Not in the queue',
    caption: 'Paid orders that cannot be packed now',
    why: 'Why',
    reasons: {
      order_disputed: 'disputed by the buyer’s bank',
      destination_paused: 'posting to this country is paused',
      on_hold: 'on hold',
      no_address: 'no address',
      not_yet: 'waits for its units, or to be looked at again',
    },
    fill: 'Look again',
    hint: 'Orders whose obstacle has gone come into the queue when you look again.',
  },
  parcelTitle: (order: string) => `Order ${order}`,
  parcelOf: (number: number, nth: number, of: number) =>
    of === 1 ? `Parcel ${number}` : `Parcel ${number}, ${nth} of ${of} of this order`,
  states: {
    open: 'to pack',
    packed: 'packed',
    handed_over: 'handed over',
    delivered: 'delivered',
    lost: 'lost',
    returned: 'returned',
    discarded: 'taken apart',
  },
  stop: 'Stop',
  address: 'Goes to',
  addressGone:
    'It arrived more than 30 days ago, so its address is not shown here any more. The owner can look at the order.',
  ownScript: 'In the buyer’s own script',
  lines: 'In the parcel',
  linesHint: 'Tick each line as it goes in.',
  each: (quantity: number, module: string, offer: string) => `${quantity} × ${module}, ${offer}`,
  serials: 'Serial numbers',
  serialsHint: 'Scan or type them, a space between. May stay empty.',
  grams: 'Weight on the scale',
  expected: (grams: number, tolerance: number) =>
    `Should be about ${writtenWeight(grams)}, give or take ${writtenWeight(tolerance)}.`,
  noExpected: 'Nobody has weighed this offer yet, so nothing can be compared.',
  scaleBlind: 'This check cannot notice the lightest piece: count it.',
  confirm: 'The parcel is right as it is; I have looked.',
  size: 'Size of the parcel',
  length: 'Length',
  width: 'Width',
  height: 'Height',
  packed: 'It is packed',
  unpack: 'Unpack it again',
  unpackHint: 'Undo is possible until it is handed over.',
  handOverTitle: 'Hand over',
  serviceHint: 'Choose one of the services to this country, or type another.',
  quoted: (service: string) => `The buyer was quoted ${service}.`,
  trackingHint: 'Scan or type it. May stay empty for a service without one.',
  handOverButton: 'It is handed over: tell the buyer',
  handOverNote: 'The buyer’s mail goes out at once. After this nothing can be undone here.',
  trackingKind: {
    s10: 'check digit verified',
    other: 'another carrier’s form; cannot be verified',
  },
  next: 'Next in the queue',
  slip: 'Packing slip',
  slipPdf: 'Packing slip as PDF',
  papersTitle: 'Papers',
  listTitle: 'Fulfilment list',
  slipsTitle: 'Packing slips',
  listPdf: 'Fulfilment list as PDF',
  slipsPdf: 'Packing slips as PDF',
  letter: 'on US Letter',
  printHint: 'Print this page, or take the PDF.',
  papersCut: (most: number) => `These are the first ${most} of the queue. Pack them, then print the next.`,
  listName: (runs: readonly { module: string; revision: string; run: number }[]) =>
    runs.length === 0
      ? 'Nothing to pack'
      : runs.map(({ module, revision, run }) => `${module}, revision ${revision}, run ${run}`).join('; '),
}
