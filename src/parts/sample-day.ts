import type { DueItem } from '../ui/hour-ruler-geometry.ts'

/** Invented work of one day: half hours with how many items each; enough to show ranks, counts and the overdue group. */
export const sampleNow = { time: '14:20', minute: 860 }

const done: [string, number][] = [
  ['06:30', 1],
  ['07:00', 2],
  ['07:30', 3],
  ['08:00', 8],
  ['08:30', 4],
  ['09:00', 3],
  ['09:30', 1],
  ['10:00', 3],
  ['10:30', 1],
  ['11:30', 1],
  ['12:30', 2],
  ['13:30', 2],
]
const due: [string, number][] = [
  ['14:00', 6],
  ['15:00', 2],
  ['16:00', 4],
  ['17:00', 1],
  ['18:00', 3],
  ['18:30', 2],
  ['20:00', 2],
  ['21:00', 1],
  ['22:00', 1],
]

const minuteOf = (time: string) => Number(time.slice(0, 2)) * 60 + Number(time.slice(3))
const items = (of: [string, number][], state: DueItem['state']) =>
  of.flatMap(([time, count]) =>
    Array.from({ length: count }, (_, i): DueItem => ({
      id: `${time} ${i}`,
      dueMinute: minuteOf(time),
      state,
      time,
      what: `Skin scrape ${i + 1}, QT-6 cownose ray`,
      until: 'by 17:00',
      to: '/parts',
    })),
  )

export const sampleDay: DueItem[] = [
  ...[
    'Order TO-0728, QC-1 coral dip, 2 days',
    'Recheck mounts, QT-5 lined seahorse, 1 day',
    'Morning count, QF-1 lake sturgeon, 5 hours',
  ].map((what, i): DueItem => ({
    id: `late ${i}`,
    dueMinute: 540 + i,
    state: 'overdue',
    time: '09:00',
    what,
    to: '/parts',
  })),
  ...items(done, 'done'),
  ...items(due, 'due'),
]
