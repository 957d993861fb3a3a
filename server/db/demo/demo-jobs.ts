import type { DemoRoofKey } from './demo-roofs.ts'

/** Days are counted in working days from today: 0 today, −1 the one before. */
export type DemoBooking = {
  crew: 'A' | 'B'
  fromWorkingDay: number
  days: number
  state: 'pencilled' | 'firm'
  gear: string
  /** Share of the tasks of days up to today that is ticked: 'all', 'half' of the last one, or 'none'. */
  done: 'all' | 'half' | 'none'
}

export type DemoJob = {
  number: string
  title: string
  siteAddress: string
  accessNotes: string
  siteContactName: string
  siteContactPhone: string
  customerName: string
  customerPhone: string
  customerEmail: string
  covering: 'tiles' | 'sheet' | 'shingles' | 'other'
  wantedInDays: number | null
  priceDollars: number | null
  /** Days before today. */
  priceSentAgo: number | null
  acceptedAgo: number | null
  completedAgo: number | null
  notes: string
  crewNotes: string
  roof: DemoRoofKey | null
  issued: boolean
  platesMeasured: boolean
  booking: DemoBooking | null
}

const blank = {
  accessNotes: '',
  wantedInDays: null,
  priceDollars: null,
  priceSentAgo: null,
  acceptedAgo: null,
  completedAgo: null,
  notes: '',
  crewNotes: '',
  roof: null,
  issued: false,
  platesMeasured: false,
  booking: null,
}

/** Ten jobs over every stage. Sites, customers and builders are invented; numbers are the regulator's for fiction. */
export const demoJobs: DemoJob[] = [
  {
    ...blank,
    number: 'QR-101',
    title: 'Garden room',
    siteAddress: '4 Tern Lane, Marrow Creek',
    siteContactName: 'Ines Calder',
    siteContactPhone: '0491 571 266',
    customerName: 'Ines Calder',
    customerPhone: '0491 571 266',
    customerEmail: 'ines.calder@customer.example',
    covering: 'sheet',
    notes: 'Rang on Friday; plan to follow by mail.',
  },
  {
    ...blank,
    number: 'QR-102',
    title: 'Carport behind the bakery',
    siteAddress: '19 Millrace Road, Marrow Creek',
    siteContactName: 'Bo Arden',
    siteContactPhone: '0491 571 491',
    customerName: 'Arden Bakery',
    customerPhone: '(07) 5550 0171',
    customerEmail: 'office@ardenbakery.example',
    covering: 'sheet',
    wantedInDays: 40,
    roof: 'carport',
  },
  {
    ...blank,
    number: 'QR-103',
    title: 'Two-bay studio',
    siteAddress: '2 Saltbush Court, Upper Marrow',
    siteContactName: 'Noor Hadley',
    siteContactPhone: '0491 571 804',
    customerName: 'Noor Hadley',
    customerPhone: '0491 571 804',
    customerEmail: 'noor.hadley@customer.example',
    covering: 'tiles',
    wantedInDays: 35,
    priceDollars: 6840,
    priceSentAgo: 4,
    roof: 'unequal',
    issued: true,
  },
  {
    ...blank,
    number: 'QR-104',
    title: 'House with octagonal end',
    siteAddress: '31 Heron Street, Marrow Creek',
    accessNotes: 'Trucks from the back lane only; gate code from the site contact.',
    siteContactName: 'Lorcan Tait',
    siteContactPhone: '0491 572 549',
    customerName: 'Tait Homes',
    customerPhone: '(07) 5550 0182',
    customerEmail: 'site@taithomes.example',
    covering: 'tiles',
    wantedInDays: 21,
    priceDollars: 9260,
    priceSentAgo: 12,
    acceptedAgo: 5,
    roof: 'octagonalEnd',
    issued: true,
  },
  {
    ...blank,
    number: 'QR-105',
    title: 'Granny flat on a skew block',
    siteAddress: '7 Curlew Close, Upper Marrow',
    siteContactName: 'Ada Winslow',
    siteContactPhone: '0491 572 665',
    customerName: 'Ada Winslow',
    customerPhone: '0491 572 665',
    customerEmail: 'ada.winslow@customer.example',
    covering: 'sheet',
    wantedInDays: 28,
    priceDollars: 7410,
    priceSentAgo: 9,
    acceptedAgo: 2,
    notes: 'Plates are not square by design: see the plan.',
    roof: 'skewPlan',
  },
  {
    ...blank,
    number: 'QR-106',
    title: 'Lookout shelter',
    siteAddress: 'Wickham Park, Marrow Creek',
    accessNotes: 'Park opens at 06:30. Keep to the gravel.',
    siteContactName: 'Rhys Malloy',
    siteContactPhone: '0491 572 983',
    customerName: 'Marrow Creek parks',
    customerPhone: '(07) 5550 0193',
    customerEmail: 'works@marrowcreek.example',
    covering: 'shingles',
    wantedInDays: 18,
    priceDollars: 3980,
    priceSentAgo: 15,
    acceptedAgo: 8,
    roof: 'pyramid',
    issued: true,
    booking: { crew: 'A', fromWorkingDay: 2, days: 1, state: 'pencilled', gear: '', done: 'none' },
  },
  {
    ...blank,
    number: 'QR-107',
    title: 'Surgery with splayed end',
    siteAddress: '88 Marrow Road, Marrow Creek',
    accessNotes: 'Patients’ entrance stays open: barrier the west side.',
    siteContactName: 'Freya Dunmore',
    siteContactPhone: '0491 573 770',
    customerName: 'Dunmore Builders',
    customerPhone: '(07) 5550 0126',
    customerEmail: 'jobs@dunmorebuilders.example',
    covering: 'tiles',
    wantedInDays: 12,
    priceDollars: 10_450,
    priceSentAgo: 20,
    acceptedAgo: 13,
    crewNotes: 'Timber is stacked on the slab, longest on top.',
    roof: 'splayedEnd',
    issued: true,
    booking: {
      crew: 'B',
      fromWorkingDay: 1,
      days: 1,
      state: 'firm',
      gear: 'Drop saw, two sawhorses, harness kit',
      done: 'none',
    },
  },
  {
    ...blank,
    number: 'QR-108',
    title: 'House, four hips',
    siteAddress: '12 Pardalote Drive, Marrow Creek',
    accessNotes: 'Park on the verge, not the neighbour’s drive.',
    siteContactName: 'Cleo Marsh',
    siteContactPhone: '0491 573 087',
    customerName: 'Marsh and Daughters Building',
    customerPhone: '(07) 5550 0137',
    customerEmail: 'cleo@marshbuilding.example',
    covering: 'tiles',
    wantedInDays: 6,
    priceDollars: 8620,
    priceSentAgo: 30,
    acceptedAgo: 22,
    crewNotes: 'Builder wants the tails left for the fascia crew to line.',
    roof: 'hip',
    issued: true,
    platesMeasured: true,
    booking: {
      crew: 'A',
      fromWorkingDay: -1,
      days: 2,
      state: 'firm',
      gear: 'Drop saw, long level, harness kit',
      done: 'half',
    },
  },
  {
    ...blank,
    number: 'QR-109',
    title: 'Hall, one hip and one gable',
    siteAddress: '3 Chapel Rise, Upper Marrow',
    accessNotes: 'Key at the house next door.',
    siteContactName: 'Ossian Pike',
    siteContactPhone: '0491 574 118',
    customerName: 'Upper Marrow hall committee',
    customerPhone: '(07) 5550 0148',
    customerEmail: 'hall@uppermarrow.example',
    covering: 'sheet',
    wantedInDays: 9,
    priceDollars: 9180,
    priceSentAgo: 26,
    acceptedAgo: 18,
    roof: 'hipAndGable',
    issued: true,
    booking: {
      crew: 'B',
      fromWorkingDay: -1,
      days: 2,
      state: 'firm',
      gear: 'Drop saw, nail guns, two planks',
      done: 'half',
    },
  },
  {
    ...blank,
    number: 'QR-110',
    title: 'Workshop, gable both ends',
    siteAddress: '55 Quarry Track, Marrow Creek',
    siteContactName: 'Hana Brockley',
    siteContactPhone: '0491 574 632',
    customerName: 'Hana Brockley',
    customerPhone: '0491 574 632',
    customerEmail: 'hana.brockley@customer.example',
    covering: 'sheet',
    wantedInDays: null,
    priceDollars: 5230,
    priceSentAgo: 44,
    acceptedAgo: 37,
    completedAgo: 3,
    roof: 'gable',
    issued: true,
    platesMeasured: true,
    booking: {
      crew: 'A',
      fromWorkingDay: -6,
      days: 1,
      state: 'firm',
      gear: 'Drop saw',
      done: 'all',
    },
  },
]
