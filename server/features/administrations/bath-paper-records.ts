import type { BathSheet, RecordedDose } from '../../../shared/contracts/doses.contract.ts'
import type { DocumentBlock, TableCell } from '../../../shared/domain/documents/pdf-document-model.ts'
import { wentIn } from '../../../shared/domain/orders/dose-states.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { bathPaper } from '../../../shared/messages/bath-paper.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { doseKindNames, orderPaper } from '../../../shared/messages/orders.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'

interface Told {
  sheet: BathSheet
  zone: string
}

const standing = ({ recorded }: BathSheet) => recorded.filter(({ struck }) => struck === null)
const pen = { pen: true } as const
const unitOf = (sheet: BathSheet) => formatDose('1', (sheet.amountNow?.unit ?? 'g') as UnitCode).symbol

/** Whether the page can still be handed to somebody who calculates without sight of the first. */
export const isForSecond = (sheet: BathSheet) => standing(sheet).length === 0 && sheet.second?.agrees !== true

/** Before the second calculation, boxes for the pen; what was calculated already in their place, with no amount. */
function boxes({ sheet, zone }: Told): DocumentBlock {
  const measure = { pen: true, unit: unitOf(sheet) } as const
  // after a disagreement neither counts, and both begin again
  const isMade = sheet.first !== null && sheet.second === null
  const first: TableCell[] =
    isMade && sheet.first
      ? [sheet.first.by, '', '', '', bathPaper.madeAt({ at: sayInstant(sheet.first.at, zone) })]
      : [pen, pen, pen, pen, measure]
  return {
    kind: 'table',
    boxed: true,
    columns: [
      { head: '', share: 0.7 },
      { head: bathPaper.person, share: 1.5 },
      { head: bathPaper.enclosureRead, share: 1.1 },
      { head: bathPaper.markRead, share: 1 },
      { head: bathPaper.containerRead, share: 1.6 },
      { head: bathPaper.amountRead, share: 1.2 },
    ],
    rows: [
      [bathPaper.first, ...first],
      [bathPaper.second, pen, pen, pen, pen, measure],
    ],
    emptyText: '',
  }
}

/** Both calculations as they were made. */
function calculated({ sheet, zone }: Told): DocumentBlock {
  const cells = (one: BathSheet['first']): TableCell[] =>
    one === null
      ? [bathPaper.notRecorded, '', '', '']
      : [one.by, sayInstant(one.at, zone), one.lotNumber ?? '', one.amountText ?? bathPaper.leftOut]
  return {
    kind: 'table',
    boxed: true,
    columns: [
      { head: '', share: 0.7 },
      { head: bathPaper.person, share: 1.6 },
      { head: bathPaper.when, share: 1.5 },
      { head: bathPaper.lotRead, share: 1 },
      { head: bathPaper.amountRead, share: 1.2 },
    ],
    rows: [
      [bathPaper.first, ...cells(sheet.first)],
      [bathPaper.second, ...cells(sheet.second)],
    ],
    emptyText: '',
  }
}

/** The two calculations: to be filled in, or as they were made. */
export function calculationBlocks(told: Told): DocumentBlock[] {
  const heading: DocumentBlock = { kind: 'heading', text: bathPaper.calculations }
  if (!isForSecond(told.sheet)) return [heading, calculated(told)]
  return [heading, { kind: 'paragraph', text: bathPaper.blindNote, size: 'small' }, boxes(told)]
}

function amountOf({ kind, record, amountText }: RecordedDose): string {
  if (record === 'broken') return doseWords.notAsRecorded
  const amount = wentIn({ kind }) ? (amountText ?? bathPaper.leftOut) : ''
  return orderPaper.amountAs({ amount, kind: doseKindNames[kind] })
}

/** Every record of the dose with its amount, also those struck out: a second one hides nothing of the first. */
function recordsTable({ sheet, zone }: Told): DocumentBlock {
  return {
    kind: 'table',
    boxed: true,
    columns: [
      { head: bathPaper.recorded, share: 1.7 },
      { head: bathPaper.started, share: 1.4 },
      { head: bathPaper.ended, share: 1.4 },
      { head: bathPaper.givenBy, share: 1.4 },
      { head: bathPaper.remarks, share: 2.2 },
    ],
    rows: sheet.recorded.map((one) => [
      amountOf(one),
      sayInstant(one.happenedAt, zone),
      one.stop ? sayInstant(one.stop.at, zone) : wentIn(one) && one.struck === null ? pen : '',
      one.by,
      [
        one.struck === null ? null : bathPaper.struck({ by: one.struck.by, reason: one.struck.reason }),
        one.note,
        one.stop?.seen,
        one.stop?.rescue,
      ]
        .filter((text) => text)
        .join(' '),
    ]),
    emptyText: '',
  }
}

function duringBlock(): DocumentBlock {
  const row = [pen, { pen: true, unit: 'mg/L' } as const, { pen: true, unit: '°C' } as const, pen]
  return {
    kind: 'table',
    boxed: true,
    columns: [
      { head: bathPaper.time, share: 0.8 },
      { head: bathPaper.oxygen, share: 1 },
      { head: bathPaper.temperature, share: 1 },
      { head: bathPaper.behaviour, share: 3 },
    ],
    rows: [row, row, row],
    emptyText: '',
  }
}

const during = (): DocumentBlock[] => [{ kind: 'heading', text: bathPaper.during }, duringBlock()]

/** The bath: lines for the pen for what is to come, and what was recorded of what has happened. */
export function bathBlocks(told: Told): DocumentBlock[] {
  const { sheet } = told
  const heading: DocumentBlock = { kind: 'heading', text: bathPaper.running }
  const records = standing(sheet)
  if (records.length === 0)
    return [
      heading,
      {
        kind: 'pen',
        fields: [
          { label: bathPaper.weighed, unit: unitOf(sheet) },
          { label: bathPaper.started },
          { label: bathPaper.endAt },
          { label: bathPaper.ended },
        ],
      },
      ...during(),
      {
        kind: 'pen',
        fields: [
          { label: bathPaper.rescue, share: 2 },
          { label: bathPaper.givenBy },
          { label: bathPaper.checkedBy },
        ],
      },
    ]
  const isRunning = records.some((one) => wentIn(one) && one.stop === null)
  return [
    heading,
    recordsTable(told),
    ...(isRunning
      ? [...during(), { kind: 'pen' as const, fields: [{ label: bathPaper.rescue, share: 2 }] }]
      : []),
  ]
}
