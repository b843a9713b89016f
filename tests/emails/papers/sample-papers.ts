import type {
  FulfilmentList,
  FulfilmentOrder,
  PackingSlips,
  PaperIssue,
  PaperLine,
} from '@/lib/contracts/papers'

export const issue: PaperIssue = {
  workshop: 'Hollow Pier Modular',
  printedBy: 'Lene Quast',
  printedOn: '2027-09-20',
  size: 'A4',
}

export const kit: PaperLine = {
  module: 'Fairlead',
  offer: 'kit',
  quantity: 1,
  choices: ['Front panel finish: sand', 'Knob colour: slate'],
  serials: [],
}
export const built: PaperLine = {
  ...kit,
  offer: 'built',
  choices: [],
  quantity: 2,
  serials: ['FL-B-0031', 'FL-B-0032'],
}

export const order = (number: string, over: Partial<FulfilmentOrder> = {}): FulfilmentOrder => ({
  number,
  name: 'Łucja Żółtowska',
  country: 'PL',
  postedBy: '2027-09-30',
  lines: [kit],
  note: null,
  ...over,
})

export const list = (
  orders: readonly FulfilmentOrder[],
  over: Partial<FulfilmentList> = {},
): FulfilmentList => ({
  ...issue,
  title: 'Fairlead, revision B, run 1',
  orders,
  ...over,
})

export const slips = (over: Partial<PackingSlips> = {}): PackingSlips => ({
  ...issue,
  from: ['Mara Quill', 'Hollow Pier Modular', 'Am Kai 3', '20457 Hamburg', 'GERMANY'],
  slips: [
    {
      orderNumber: '1042',
      parcel: { nth: 1, of: 2 },
      isReplacement: false,
      language: 'en',
      to: ['Hanako Mori', '1-2 Honmachi, Minato-ku', 'Tokyo 105-0001', 'JAPAN'],
      toOwnScript: null,
      lines: [kit, built],
      problemUrl: 'https://brimline.example/account/orders/7c0e',
    },
  ],
  ...over,
})
