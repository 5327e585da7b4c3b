/** One due item of today. */
export interface DueItem {
  id: string
  /** Minutes after midnight, facility time, when it was due. 0 … 1439. */
  dueMinute: number
  state: 'done' | 'due' | 'overdue'
  /** As shown, "14:00". */
  time: string
  /** What and where: "free copper test, QT-2". */
  what: string
  /** More for the tip: "by 17:00". */
  until?: string
  to: string
}

export interface RulerTick {
  x: number
  hollow: boolean
}

/** Items of the same half hour (whole hour when narrow), standing side by side from its beginning. */
export interface RulerRank {
  x: number
  width: number
  ticks: RulerTick[]
  /** More than five items: one tick, and how many there are (all, when all are done; else those still to do). */
  count: { text: string; x: number; anchor: 'start' | 'end'; ink: boolean } | null
  items: DueItem[]
}

export interface RulerGeometry {
  width: number
  narrow: boolean
  tickWidth: number
  grades: { x: number; width: number }[]
  hourNames: { x: number; text: string }[]
  ranks: RulerRank[]
  overdue: {
    rings: number[]
    words: { x: number; text: string } | null
    number: string | null
    items: DueItem[]
  }
  nowX: number
  /** The time stands left of the mark near the right end. */
  nowTextLeft: boolean
  /** Every item in reading order, overdue first, with the place of its mark. */
  stops: { item: DueItem; x: number; overdue: boolean }[]
}

const dayMinutes = 1440
const mostInRank = 5
const mostRings = 3
const ringFirst = 8
const ringPitch = 15
const narrowBelow = 1000

/**
 * Places every mark of the hour ruler. A tick never changes its place when it is done; an overdue item leaves its hour
 * and joins the rings at the left end.
 *
 * @param widthPx   width of the ruler, CSS px
 * @param nowMinute minutes after midnight, facility time
 * @param overdueWords words of the overdue group, already counted
 */
export function layHourRuler(
  items: readonly DueItem[],
  widthPx: number,
  nowMinute: number,
  overdueWords: string,
): RulerGeometry {
  const narrow = widthPx < narrowBelow
  const x = (minute: number) => (minute / dayMinutes) * widthPx
  const nowX = x(nowMinute)
  const late = items.filter((item) => item.state === 'overdue').sort((a, b) => a.dueMinute - b.dueMinute)
  const overdue = overdueGroup(late, narrow, overdueWords)
  const groupEnd = overdueEnd(overdue)
  const ranks = layRanks(items, narrow, x, nowX)
  const every = narrow ? 4 : 2
  const hours = Array.from({ length: 24 / every - 1 }, (_, i) => (i + 1) * every)

  return {
    width: widthPx,
    narrow,
    tickWidth: narrow ? 3.6 : 4,
    grades: Array.from({ length: 12 }, (_, i) => ({ x: x(i * 120), width: x(60) })),
    hourNames: hours
      .map((hour) => ({ x: x(hour * 60), text: String(hour).padStart(2, '0') }))
      .filter(({ x: at }) => (at < nowX - 20 || at > nowX + 46) && at - 8 > groupEnd),
    ranks,
    overdue,
    nowX,
    nowTextLeft: nowX > widthPx - 48,
    stops: [
      ...late.map((item, i) => ({
        item,
        x: overdue.rings[Math.min(i, overdue.rings.length - 1)] ?? ringFirst,
        overdue: true,
      })),
      ...ranks.flatMap((rank) =>
        rank.items.map((item, i) => ({
          item,
          x: (rank.ticks[Math.min(i, rank.ticks.length - 1)]?.x ?? rank.x) + (narrow ? 1.8 : 2),
          overdue: false,
        })),
      ),
    ],
  }
}

function layRanks(
  items: readonly DueItem[],
  narrow: boolean,
  x: (minute: number) => number,
  nowX: number,
): RulerRank[] {
  const span = narrow ? 60 : 30
  const pitch = narrow ? 5 : 5.7
  const byRank = new Map<number, DueItem[]>()
  for (const item of items) {
    if (item.state === 'overdue') continue
    const start = Math.floor(item.dueMinute / span) * span
    byRank.set(start, [...(byRank.get(start) ?? []), item])
  }
  return [...byRank.entries()]
    .sort(([a], [b]) => a - b)
    .map(([start, members]) => {
      const inOrder = [...members].sort((a, b) => a.dueMinute - b.dueMinute)
      const first = x(start) + 1.5
      const rank = { x: x(start), width: x(span), items: inOrder }
      if (inOrder.length <= mostInRank) {
        const ticks = inOrder.map((item, i) => ({ x: first + i * pitch, hollow: item.state === 'done' }))
        return { ...rank, ticks, count: null }
      }
      const toDo = inOrder.filter((item) => item.state !== 'done').length
      const left = Math.abs(nowX - first) < 24
      return {
        ...rank,
        ticks: [{ x: first, hollow: toDo === 0 }],
        count: {
          text: String(toDo === 0 ? inOrder.length : toDo),
          x: left ? first - 3 : first + 6.5,
          anchor: left ? ('end' as const) : ('start' as const),
          ink: toDo > 0,
        },
      }
    })
}

function overdueGroup(items: DueItem[], narrow: boolean, words: string): RulerGeometry['overdue'] {
  if (items.length === 0) return { rings: [], words: null, number: null, items }
  const many = items.length > mostRings
  // narrow and many: the number stands in the ring's place, and the words are in the description
  if (narrow && many) return { rings: [], words: null, number: String(items.length), items }
  const rings = Array.from({ length: many ? 1 : items.length }, (_, i) => ringFirst + i * ringPitch)
  const last = rings[rings.length - 1] ?? ringFirst
  return { rings, words: narrow ? null : { x: last + 11, text: words }, number: null, items }
}

/** Right end of the overdue group; a letter of the words takes about 5.6 px. */
function overdueEnd(group: RulerGeometry['overdue']): number {
  if (group.words) return group.words.x + group.words.text.length * 5.6
  if (group.number) return 4 + group.number.length * 7
  const last = group.rings[group.rings.length - 1]
  return last === undefined ? -Infinity : last + 7
}

/** The stop that a key leads to, `null` for a key that does not move. */
export function stopAfterKey(key: string, at: number, count: number): number | null {
  if (count === 0) return null
  if (key === 'ArrowRight' || key === 'ArrowDown') return Math.min(count - 1, at + 1)
  if (key === 'ArrowLeft' || key === 'ArrowUp') return Math.max(0, at - 1)
  if (key === 'Home') return 0
  if (key === 'End') return count - 1
  return null
}

/** The stop nearest to a pointer at `x`, among the given ones. */
export function nearestStop(stops: readonly { x: number }[], x: number): number {
  let best = 0
  stops.forEach((stop, i) => {
    const than = stops[best]
    if (than && Math.abs(stop.x - x) < Math.abs(than.x - x)) best = i
  })
  return best
}
