import type { ParcelPaper, ParcelPapers } from '@/lib/contracts/papers'
import { minor } from '@/lib/core/brand'
import { built, kit } from './sample-papers'

const line = {
  description: 'Kit for an audio signal mixer module',
  quantity: 1,
  value: minor(16_500),
  grams: 380,
  code: '8543709000',
  origin: 'DE',
}

export const parcel = (over: Partial<ParcelPaper> = {}): ParcelPaper => ({
  parcel: 'a',
  number: 7,
  orderNumber: '1042',
  place: { nth: 1, of: 1 },
  isReplacement: false,
  to: ['Hanako Mori', '1-2 Honmachi, Minato-ku', 'Tokyo 105-0001', 'JAPAN'],
  toOwnScript: ['〒105-0001', '東京都港区本町1-2', '森 花子 様', 'JAPAN'],
  country: 'JP',
  phone: '+81 3 5550 0101',
  taxNumber: null,
  service: 'Parcel, tracked',
  tracking: null,
  grams: 420,
  lines: [kit],
  customs: {
    form: 'CN23',
    lines: [line],
    valueMinor: 16_500,
    currency: 'EUR',
    problems: [],
    duties: 'buyer_pays',
  },
  ...over,
})

/** To the four scripts a label must carry, and one inside the customs area. */
export const samples: readonly ParcelPaper[] = [
  parcel(),
  parcel({
    orderNumber: '1043',
    to: ['Kim Min-jun', '123 Teheran-ro, Gangnam-gu', 'Seoul 06133', 'SOUTH KOREA'],
    toOwnScript: ['서울특별시 강남구', '테헤란로 123', '김민준 귀하', '06133', 'SOUTH KOREA'],
    country: 'KR',
    taxNumber: 'P123456789012',
  }),
  parcel({
    orderNumber: '1044',
    to: ['Li Wei', '8 Jianguo Road, Chaoyang', 'Beijing 100022', 'CHINA'],
    toOwnScript: ['100022', '北京市朝阳区建国路8号', '李伟', 'CHINA'],
    country: 'CN',
  }),
  parcel({
    orderNumber: '1045',
    to: ['Eleni Papadaki', 'Odos Ermou 12', '105 63 Athina', 'GREECE'],
    toOwnScript: ['Ελένη Παπαδάκη', 'Οδός Ερμού 12', '105 63 Αθήνα', 'GREECE'],
    country: 'GR',
    customs: { ...parcel().customs, form: 'none' },
    lines: [built],
    tracking: 'RR473124829GB',
  }),
  parcel({
    orderNumber: '1046',
    to: ['Darya Petrova', 'ul. Vitosha 5', '1000 Sofia', 'BULGARIA'],
    toOwnScript: ['Даря Петрова', 'ул. Витоша 5', '1000 София', 'BULGARIA'],
    country: 'BG',
    customs: { ...parcel().customs, form: 'none' },
  }),
  parcel({
    orderNumber: '1047',
    isReplacement: true,
    to: ['Ada Grove', '12 Mill Lane', 'Leeds', 'LS1 4DY', 'UNITED KINGDOM'],
    toOwnScript: null,
    country: 'GB',
    customs: { ...parcel().customs, form: 'CN22' },
  }),
]

export const parcelPapers = (parcels: readonly ParcelPaper[] = samples): ParcelPapers => ({
  workshop: 'Hollow Pier Modular',
  printedBy: 'Lene Quast',
  printedOn: '2027-09-20',
  from: ['Mara Quill', 'Hollow Pier Modular', 'Am Kai 3', '20457 Hamburg', 'GERMANY'],
  fromPhone: '+49 40 5550 010',
  fromTaxNumber: 'DE000000000',
  parcels,
})
