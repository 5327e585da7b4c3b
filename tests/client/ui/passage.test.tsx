import { describe, expect, it, vi } from 'vitest'
import { coastPath } from '../../../src/ui/passage/coast.ts'
import { dayScale } from '../../../src/ui/passage/day-scale.ts'
import { layCaseLabels } from '../../../src/ui/passage/case-labels.ts'
import {
  harbourLines,
  labelWords,
  oldLegWords,
  soundings,
  wholeOf,
} from '../../../src/ui/passage/case-words.ts'
import { nowLinePieces } from '../../../src/ui/passage/now-line.ts'
import { caseHalf, layPassage, overlap, textBox } from '../../../src/ui/passage/passage-geometry.ts'
import { PassageBoard } from '../../../src/ui/passage/passage-board.tsx'
import { PassageCase } from '../../../src/ui/passage/passage-case.tsx'
import { PassageTable } from '../../../src/ui/passage/passage-table.tsx'
import { passageSummary, pauseWords } from '../../../src/ui/passage/passage-words.ts'
import type { PassageFix, PassageLeg, PassageView } from '../../../src/ui/passage/passage-view.ts'
import { rulerDates } from '../../../src/ui/day-ruler.tsx'
import type { StepState } from '../../../src/ui/step-mark.tsx'
import { click, draw, drawsComponents, focus, one, press } from '../../support/react.tsx'

drawsComponents()

const fix = (on: string, state: StepState, name: string, more: Partial<PassageFix> = {}): PassageFix => ({
  id: `${name} ${on}`,
  on,
  state,
  name,
  ...more,
})
const leg = (from: string, fixes: PassageFix[], more: Partial<PassageLeg> = {}): PassageLeg => ({
  from,
  until: null,
  fixes,
  counts: [],
  pauses: [],
  ...more,
})
const ray = (more: Partial<PassageView> = {}): PassageView => ({
  id: 'Q-115',
  number: 'Q-115',
  name: 'Cownose ray',
  detail: 'QT-6, 4 animals',
  to: '/quarantine/Q-115',
  flag: 'Q',
  day: 19,
  lengthDays: 30,
  held: null,
  today: '2026-05-14',
  legs: [
    leg('2026-04-08', [fix('2026-04-11', 'done', 'exam')], { until: '2026-04-25', endWords: 'a ray joined' }),
    leg('2026-04-25', [
      fix('2026-04-28', 'done', 'hands-on exam'),
      fix('2026-05-08', 'failed', 'bath'),
      fix('2026-05-14', 'due', 'skin scrape'),
      fix('2026-05-23', 'to-come', 'faecal'),
    ]),
  ],
  harbour: { on: '2026-05-25', allMet: false },
  notes: [],
  ...more,
})

/* The board of the design drawings: 95 days across 852 px from 30 March, about 9 px a day. */
const board = dayScale('2026-03-30', '2026-07-02', 852)
const lay = (view: PassageView) => layPassage(view, board, 33, 'roomy')

describe('the geometry', () => {
  it('stands a date at the beginning of its day', () => {
    expect(board.x('2026-05-14')).toBeCloseTo(403.6, 1)
    expect(board.x('2026-05-25')).toBeCloseTo(502.2, 1)
  })

  it('draws the course made to now and the course ahead to 9 px before the harbour', () => {
    const course = lay(ray())
    expect(course.made).toHaveLength(1)
    expect(course.made[0]?.x1).toBeCloseTo(233.2, 1)
    expect(course.made[0]?.x2).toBeCloseTo(403.6, 1)
    expect(course.ahead?.x2).toBeCloseTo(493.2, 1)
  })

  it('keeps a leg that no longer counts 14 px higher, with the break where the clock was restarted', () => {
    const [old] = lay(ray()).oldLegs
    expect(old?.y).toBe(19)
    expect(old?.breakX).toBeCloseTo(233.2, 1)
  })

  it('shows a ship on the line of now unless a due ring stands there', () => {
    expect(lay(ray()).shipX).toBeNull()
    const moving = ray({ legs: [leg('2026-05-10', [fix('2026-05-10', 'done', 'count')])] })
    expect(lay(moving).shipX).toBeCloseTo(411.6, 1)
  })

  it('leaves a gap as long as a pause', () => {
    const course = lay(
      ray({ legs: [leg('2026-04-13', [], { pauses: [{ from: '2026-04-24', until: '2026-04-27' }] })] }),
    )
    expect(course.pauses[0]?.days).toBe(3)
    expect(course.made).toHaveLength(2)
    expect((course.made[1]?.x1 ?? 0) - (course.made[0]?.x2 ?? 0)).toBeCloseTo(3 * board.pxPerDay, 5)
  })

  it('still pauses today when the pause has no end', () => {
    const course = lay(
      ray({ legs: [leg('2026-04-13', [], { pauses: [{ from: '2026-05-10', until: null }] })] }),
    )
    expect(course.pauses[0]?.days).toBe(4)
    expect(course.made).toHaveLength(1)
  })

  it('holds with two strokes 12 px past now, and no harbour', () => {
    const course = lay(ray({ held: 'No movement.' }))
    expect(course.heldX).toBeCloseTo(415.6, 1)
    expect(course.harbourX).toBeNull()
    expect(course.ahead).toBeNull()
    expect(course.shipX).toBeNull()
  })

  it('says when a passage began before the ruler does', () => {
    expect(lay(ray({ legs: [leg('2026-03-14', [])] })).beginsBefore).toBe(true)
    expect(lay(ray()).beginsBefore).toBe(false)
  })

  it('makes equal steps closer than 10 px one mark with a count, and never swallows a failed or overdue one', () => {
    const course = lay(
      ray({
        legs: [
          leg('2026-05-11', [
            fix('2026-05-11', 'done', 'a'),
            fix('2026-05-12', 'done', 'b'),
            fix('2026-05-13', 'overdue', 'c', { late: '1 day late' }),
            fix('2026-05-16', 'failed', 'd'),
            fix('2026-05-17', 'failed', 'e'),
          ]),
        ],
      }),
    )
    expect(course.marks.map((mark) => [mark.state, mark.fixes.length])).toEqual([
      ['done', 2],
      ['overdue', 1],
      ['failed', 1],
      ['failed', 1],
    ])
  })

  it('never lets words of a row run into one another or over the edge', () => {
    const view = ray({
      legs: [leg('2026-03-31', [fix('2026-04-02', 'overdue', 'recheck mounts', { late: '42 days late' })])],
      notes: [{ on: '2026-04-03', words: 'death 3 April, end moved 12 days' }],
    })
    const texts = lay(view).texts
    expect(texts.map((text) => text.kind)).toEqual(['late'])
    expect(texts[0]?.anchor).toBe('start')
  })

  it('draws one coast from row to row, as the design drawing has it', () => {
    expect(
      coastPath([
        { top: 0, height: 68, shoreX: 416.6 },
        { top: 68, height: 68, shoreX: 452.5 },
      ]),
    ).toBe('M416.6 0V42.2C416.6 76.2 452.5 54.4 452.5 91.1V136')
  })

  it('prints a date every 7 days, the first of a month in bold, and fewer where days are narrow', () => {
    const wide = rulerDates(board)
    expect(wide.slice(0, 3).map((date) => [date.date, date.bold])).toEqual([
      ['2026-03-30', false],
      ['2026-04-06', true],
      ['2026-04-13', false],
    ])
    const narrow = rulerDates(dayScale('2026-03-30', '2026-07-02', 358))
    expect(narrow[1]?.date).toBe('2026-04-13')
  })

  it('puts the labels of a case on one side of the line of now, and due ones first', () => {
    const scale = dayScale('2026-04-06', '2026-06-02', 1128)
    const course = layPassage(ray(), scale, 136, 'case')
    const labels = layCaseLabels(ray(), course.marks, 136, 1128, course.nowX, (day) => `day ${day}`)
    const due = labels.find((label) => label.words === 'skin scrape')
    expect(due).toMatchObject({ anchor: 'end', day: 'day 19', dayY: 158 })
    expect(due?.x).toBeCloseTo(course.nowX - 10, 5)
  })

  it('keeps labels in the drawing of a phone, and breaks the line of now where words stand', () => {
    const width = 358
    const view = ray({ today: '2026-04-28', harbour: { on: '2026-05-25', allMet: false } })
    const scale = dayScale('2026-04-06', '2026-06-02', width)
    const course = layPassage(view, scale, 136, 'case')
    const labels = layCaseLabels(view, course.marks, 136, width, course.nowX, (day) => `day ${String(day)}`)
    const words = [
      ...course.oldLegs.flatMap((old) => oldLegWords(old, true, scale)),
      ...labelWords(labels),
      ...harbourLines(view, course, { width, courseY: 136, footY: 192 }),
    ].map(wholeOf)
    for (const label of labelWords(labels)) {
      const { x1, x2 } = textBox(label)
      expect([label.text, x1 >= 0, x2 <= width]).toEqual([label.text, true, true])
    }
    const onLine = words.filter((one) => {
      const { x1, x2 } = textBox(one)
      return x1 < course.nowX && course.nowX < x2
    })
    expect(onLine.map(({ text }) => text)).toContain('a ray joined')
    const pieces = nowLinePieces(course.nowX, 0, 212, words)
    for (const { text, y } of onLine)
      expect([text, pieces.filter(({ y1, y2 }) => y1 < y && y2 > y - 8)]).toEqual([text, []])
    expect(nowLinePieces(course.nowX, 0, 212, [])).toEqual([{ y1: 0, y2: 212 }])
  })

  it('never lets two counts read as one number, nor a label run into the words over a pause', () => {
    const width = 358
    const scale = dayScale('2026-04-06', '2026-06-02', width)
    const counts = [
      { on: '2026-04-25', animals: '22' },
      { on: '2026-04-26', animals: '21' },
      { on: '2026-05-10', animals: '20' },
    ]
    const pauses = [{ from: '2026-05-02', until: '2026-05-03' }]
    const fixes = ['04-25', '04-27', '04-29', '05-01', '05-04'].map((day) =>
      fix(`2026-${day}`, 'failed', 'hands-on'),
    )
    const view = ray({ legs: [leg('2026-04-25', fixes, { counts, pauses })] })
    const course = layPassage(view, scale, 136, 'case')
    const over = pauseWords(course, caseHalf)
    expect(over.map(({ text }) => text)).toEqual([expect.stringMatching(/^paused 1.day$/)])
    const labels = layCaseLabels(
      view,
      course.marks,
      136,
      width,
      course.nowX,
      (day) => `day ${String(day)}`,
      over,
    )
    expect(labels.length).toBeGreaterThan(1)
    for (const label of labelWords(labels))
      for (const words of over) expect(overlap(textBox(label), textBox(words)), label.text).toBe(false)
    expect(soundings(view, scale, [], 136).map(({ text }) => text)).toEqual(['21', '20'])
  })
})

describe('for who does not see it', () => {
  it('says number, animals, day and length, what is due, and the earliest clearance', () => {
    expect(passageSummary(ray())).toBe(
      'Q-115 Cownose ray. Day 19 of 30. skin scrape due today. earliest clearance 25\u00a0May',
    )
    expect(passageSummary(ray({ held: 'No movement.' }))).toContain('No movement.')
  })

  it('gives the steps as a table', async () => {
    const { place } = await draw(<PassageTable view={ray()} />)
    const rows = [...place.querySelectorAll('tbody tr')]
    expect(rows.map((row) => [...row.children].map((cell) => cell.textContent))).toEqual([
      ['step done', '3', '28\u00a0Apr', 'hands-on exam', ''],
      ['failed', '13', '8\u00a0May', 'bath', ''],
      ['due today', '19', 'today', 'skin scrape', ''],
      ['to come', '28', '23\u00a0May', 'faecal', ''],
    ])
  })
})

describe('the marks', () => {
  const marks = (place: HTMLElement) => [...place.querySelectorAll<HTMLElement>('.passage-fix')]

  it('can be walked along the course, are named, and open', async () => {
    const onOpenFix = vi.fn()
    const { place } = await draw(
      <PassageCase view={ray()} from="2026-04-06" until="2026-06-02" onOpenFix={onOpenFix} />,
    )
    expect(marks(place).map((mark) => mark.getAttribute('aria-label'))).toEqual([
      'exam, day 3, Sat\u00a011\u00a0Apr, step done',
      'hands-on exam, day 3, Tue\u00a028\u00a0Apr, step done',
      'bath, day 13, Fri\u00a08\u00a0May, failed',
      'skin scrape, day 19, Thu\u00a014\u00a0May, due today',
      'faecal, day 28, Sat\u00a023\u00a0May, to come',
    ])
    // one tab stop, on what is due
    expect(marks(place).map((mark) => mark.tabIndex)).toEqual([-1, -1, -1, 0, -1])
    await focus(marks(place)[3]!)
    await press('ArrowRight')
    expect(document.activeElement).toBe(marks(place)[4])
    await press('Home')
    expect(document.activeElement).toBe(marks(place)[0])
    await press('End')
    await press('ArrowLeft')
    await click(document.activeElement!)
    expect(onOpenFix).toHaveBeenCalledWith(['skin scrape 2026-05-14'])
  })

  it('have targets 24 px high, up to 24 wide, that meet halfway between close neighbours', async () => {
    const view = ray({
      legs: [
        leg('2026-05-11', [
          fix('2026-05-12', 'done', 'a', { to: '/a' }),
          fix('2026-05-14', 'due', 'b', { to: '/b' }),
        ]),
      ],
    })
    const { place } = await draw(
      <PassageBoard
        passages={[view]}
        from="2026-03-30"
        until="2026-07-02"
        today="2026-05-14"
        density="roomy"
      />,
    )
    const [first, second] = marks(place).map((mark) => mark.style)
    expect(first?.height).toBe('24px')
    expect(parseFloat(first?.left ?? '') + parseFloat(first?.width ?? '')).toBeCloseTo(
      parseFloat(second?.left ?? ''),
      3,
    )
    expect(parseFloat(first?.width ?? '')).toBeGreaterThan(20)
  })

  it('stand on a board where each case is a link with its whole summary', async () => {
    const views = [
      ray(),
      ray({ id: 'Q-116', number: 'Q-116', held: 'No movement.', flag: 'L', to: '/quarantine/Q-116' }),
    ]
    const { place } = await draw(
      <PassageBoard
        passages={views}
        from="2026-03-30"
        until="2026-07-02"
        today="2026-05-14"
        density="close"
      />,
    )
    const rows = [...place.querySelectorAll<HTMLAnchorElement>('.board-row')]
    expect(rows.map((row) => row.getAttribute('href'))).toEqual(['/quarantine/Q-115', '/quarantine/Q-116'])
    expect(rows[0]?.getAttribute('aria-label')).toContain('Day 19 of 30')
    expect(one(place, 'svg[role="img"]').getAttribute('aria-label')).toContain('2\u00a0quarantine passages')
  })
})
