import { overrideOf } from '../../../shared/domain/orders/signed-answers.ts'
import type {
  DocumentBlock,
  PdfDocumentModel,
  TableCell,
} from '../../../shared/domain/documents/pdf-document-model.ts'
import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { isTextSound } from '../../../shared/domain/orders/is-text-sound.ts'
import { exceptionsWithoutFigures } from '../../../shared/domain/dose/exceptions-without-figures.ts'
import { plannedDoses } from '../../../shared/domain/orders/planned-doses.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { documentWords } from '../../../shared/messages/documents.ts'
import { basisNames } from '../../../shared/messages/formulary.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { doseKindNames, orderPaper, orderWords, relationshipWords } from '../../../shared/messages/orders.ts'
import { faultWords, sayFault, sayFaultNotice } from '../../../shared/messages/record-fault.ts'
import { sayDate, sayInstant, sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { checkBlock } from '../../platform/pdf/check-block.ts'
import { signedFrame } from '../../platform/pdf/signed-frame.ts'
import { signatureEntry } from '../../platform/pdf/signature-entry.ts'
import { standingCaution } from '../../platform/pdf/standing-caution.ts'
import { workingBlock } from '../../platform/pdf/working-block.ts'
import type { SignedOrder } from './order-content.ts'
import type { RecordedDoseRow } from './orders.reads.ts'
import { sayTreated } from './say-order.ts'
import { sayRounding } from './say-rounding.ts'

export interface OrderPaper {
  /** What was signed; the columns beside it where the text was changed. */
  content: SignedOrder
  block: SignatureBlock
  row: OrderRow
  /** What is recorded of its doses, the newest first. */
  recorded: readonly RecordedDoseRow[]
  superseded: boolean
  facility: string
  publicUrl: string
  paper: 'a4' | 'letter'
  printedBy: string
  printedAt: string
}

/** A state of the order that no page may hide; null when doses may be given from it. */
export function orderNotice({
  block,
  row,
  superseded,
  versionNo,
}: Pick<OrderPaper, 'block' | 'row' | 'superseded'> & { versionNo: number }): string | null {
  if (block.state !== 'intact')
    return block.fault ? sayFaultNotice(block.fault) : documentWords.recordUnknownKey
  if (superseded) return documentWords.supersededNotice({ version: orderPaper.version({ n: versionNo + 1 }) })
  if (row.phase === 'held') return documentWords.heldNotice
  if (row.phase === 'discontinued') return orderPaper.discontinued
  if (row.phase === 'expired') return orderPaper.expired
  if (row.phase === 'in-progress' && row.nextDueAt === null) return orderPaper.lastRuns
  return row.phase === 'completed' ? orderPaper.completed : null
}

/** Beside a failed check an amount is only that of the text, and is said to be; of a key from elsewhere not even that. */
const amountFrom = ({ state, fault }: SignatureBlock) =>
  state === 'intact' ? {} : { above: fault ? faultWords.fromText : faultWords.unknownKey }

function productBlock({ content, block }: OrderPaper): DocumentBlock {
  const { amount, product, lot } = content
  const measured = amount.measured ?? { value: String(amount.unrounded), unit: amount.unroundedUnit }
  const { number, symbol } = formatDose(measured.value, measured.unit as UnitCode)
  const strength = formatDose(product.strength.value, product.strength.unit as UnitCode).text
  return {
    kind: 'amount',
    ...amountFrom(block),
    value: number,
    unit: symbol,
    lines: [
      [
        { text: product.establishedName, bold: true },
        { text: ` (${product.productName}), ` },
        {
          text: orderPaper.strength({
            strength,
            basis: basisNames[product.strengthBasis as keyof typeof basisNames],
          }),
        },
        {
          text: lot
            ? orderPaper.lot({ lot: lot.lotNumber, expires: sayDate(lot.expiresOn) })
            : orderPaper.noLot,
        },
        { text: orderPaper.into, bold: true },
      ],
    ],
    ...(amount.rangeText ? { limits: orderPaper.range({ range: amount.rangeText }) } : {}),
  }
}

function particulars({ content, block }: OrderPaper): DocumentBlock {
  const { fields, doseLine } = content
  const entries = [
    { label: orderPaper.problem, value: fields.problem },
    { label: orderPaper.target, value: `${content.targetText} ${content.basisText}` },
    ...(doseLine
      ? [{ label: orderPaper.doseLine, value: `${doseLine.text}; ${doseLine.citation} (${doseLine.mark})` }]
      : []),
    {
      label: orderPaper.contact,
      value:
        fields.timing === 'timed' && fields.contactMinutes !== null
          ? formatDose(fields.contactMinutes, 'min').text
          : orderPaper.contactIndefinite,
    },
    {
      label: orderPaper.doses,
      value: orderPaper.dosesText({ doses: fields.doses, hours: fields.intervalHours }),
    },
    {
      label: orderPaper.start,
      value: fields.startsAt ? sayInstantWithOffset(fields.startsAt, block.zone) : '',
    },
    {
      label: orderPaper.use,
      value: fields.use === 'extralabel' ? orderPaper.extralabel : orderPaper.asLabelled,
    },
    {
      label: orderPaper.water,
      value: orderPaper.waterText({
        bodies: content.water.bodies.join(', '),
        valves: content.valves.map((valve) => orderPaper.valve(valve)).join(', '),
      }),
    },
    ...(fields.instructions === '' ? [] : [{ label: orderPaper.how, value: fields.instructions }]),
  ]
  return { kind: 'grid', entries }
}

/** From the last line of the working to what is weighed, in the words of the screen. */
function roundingBlock({ content: { amount, fields } }: OrderPaper): DocumentBlock[] {
  if (!amount.measured || !fields.division) return []
  const unrounded = { value: amount.unrounded, unit: amount.unroundedUnit as UnitCode }
  return [{ kind: 'paragraph', text: sayRounding(unrounded, fields.division, amount.text) }]
}

function cautionBlocks({ content, block }: OrderPaper): DocumentBlock[] {
  if (content.cautions.length === 0) return [{ kind: 'paragraph', text: orderPaper.noCautions }]
  return content.cautions.map((caution) => {
    const override = overrideOf(content.overrides, caution)
    return {
      kind: 'caution',
      level: caution.level,
      title: caution.title,
      lines: [caution.text],
      ...(override
        ? {
            override: [
              { text: orderPaper.overridden({ name: block.printedName }), bold: true },
              { text: orderPaper.reason({ reason: override.reason }) },
            ],
          }
        : {}),
    }
  })
}

function animalsBlock({ content }: OrderPaper): DocumentBlock {
  return {
    kind: 'table',
    columns: [
      { head: orderPaper.accession, share: 1 },
      { head: orderPaper.animal, share: 2.6 },
      { head: orderPaper.count, share: 1.2 },
      { head: orderPaper.place, share: 0.9 },
      { head: orderPaper.treated, share: 1.3 },
    ],
    rows: content.water.animals.map((animal) => [
      animal.accession,
      [{ text: `${animal.commonName} ` }, { text: animal.scientificName, italic: true }],
      animal.countText,
      animal.enclosureCode,
      animal.treated ? orderPaper.yes : orderPaper.shares,
    ]),
    emptyText: orderPaper.noAnimals,
  }
}

/** A dose that is recorded already has no box left for the pen: it might be given again. */
function recordedCells(dose: RecordedDoseRow, zone: string): TableCell[] {
  const { amount_entered_value: value, amount_entered_unit: unit, ended_at } = dose
  const amount = value === null || unit === null ? '' : formatDose(value, unit as UnitCode).text
  return [
    dose.second_by ?? orderPaper.noSecond,
    dose.is_as_written
      ? orderPaper.amountAs({ amount, kind: doseKindNames[dose.kind] })
      : doseWords.notAsRecorded,
    sayInstant(dose.happened_at.toISOString(), zone),
    ended_at === null ? '' : sayInstant(ended_at.toISOString(), zone),
    dose.by_name ?? '',
  ]
}

function givenBlock({ content, block, recorded }: OrderPaper): DocumentBlock {
  const { fields, amount } = content
  const unit = amount.measured?.unit ?? amount.unroundedUnit
  const pen = true as const
  const planned = fields.startsAt
    ? plannedDoses(
        { startsAt: fields.startsAt, doses: fields.doses, intervalHours: fields.intervalHours },
        block.zone,
      )
    : []
  return {
    kind: 'table',
    boxed: true,
    columns: [
      { head: orderPaper.dose, share: 0.7 },
      { head: orderPaper.due, share: 1.5 },
      { head: orderPaper.second, share: 1.6 },
      { head: orderPaper.measured, share: 1.6 },
      { head: orderPaper.started, share: 1.1 },
      { head: orderPaper.ended, share: 1.1 },
      { head: orderPaper.by, share: 1.4 },
    ],
    // every record of a dose has its line: a second one must not hide the first
    rows: planned.flatMap(({ key, dueAt }) => {
      const known = recorded.filter((dose) => dose.dose_key === key).reverse()
      const forThePen = [{ pen, unit }, { pen, unit }, { pen }, { pen }, { pen }]
      const cells = known.length === 0 ? [forThePen] : known.map((dose) => recordedCells(dose, block.zone))
      return cells.map((own) => [key, sayInstant(dueAt, block.zone), ...own])
    }),
    emptyText: orderWords.noVolume,
  }
}

/** What a line of the table cannot say: what was against the rules, and that a bath was stopped before its time. */
function noteBlocks({ recorded, block }: OrderPaper): DocumentBlock[] {
  return [...recorded].reverse().flatMap((dose) => {
    const at = sayInstant(dose.happened_at.toISOString(), block.zone)
    const found = JSON.parse(dose.exceptions_text) as { code: string; text: string }[]
    const texts = (dose.is_as_written ? found : exceptionsWithoutFigures(found)).map(({ text }) => text)
    if (dose.stopped_at !== null) {
      const stopped = sayInstant(dose.stopped_at.toISOString(), block.zone)
      texts.push(orderPaper.stoppedEarly({ at: stopped, seen: dose.stopped_seen ?? '' }))
    }
    return texts.map((text): DocumentBlock => {
      const note = orderPaper.doseNote({ key: dose.dose_key, at, text })
      return { kind: 'paragraph', text: [{ text: note, bold: true }] }
    })
  })
}

/** Doses that no second person calculated. */
const aloneBlocks = ({ recorded }: OrderPaper): DocumentBlock[] =>
  recorded.flatMap(({ dose_key: key, second_by: by, alone_after_minutes: minutes }): DocumentBlock[] =>
    by === null || minutes === null
      ? []
      : [
          {
            kind: 'paragraph',
            text: orderPaper.alone({ key, calculated: doseWords.calculatedAloneBy({ by, minutes }) }),
          },
        ],
  )

/** What the signer stated of knowing these animals; nothing in an order by the label. */
const relationshipBlocks = ({ content }: OrderPaper): DocumentBlock[] =>
  content.relationship
    ? [
        { kind: 'heading', text: relationshipWords.heading },
        { kind: 'paragraph', text: content.relationship },
      ]
    : []

/** What an order says on paper, from its text. */
function statements(paper: OrderPaper): DocumentBlock[] {
  const { content } = paper
  return [
    {
      kind: 'columns',
      divided: true,
      columns: [
        { share: 1, blocks: [productBlock(paper)] },
        { share: 1.25, blocks: [particulars(paper)] },
      ],
    },
    { kind: 'rule' },
    {
      kind: 'heading',
      text: orderPaper.volumeHeading({
        volume: content.water.volumeText ?? '',
        note: content.water.volumeNote ?? '',
      }),
    },
    { kind: 'heading', text: orderPaper.workingHeading },
    workingBlock(content.working),
    ...roundingBlock(paper),
    { kind: 'heading', text: orderPaper.conditionsHeading },
    { kind: 'conditions', columns: 2, items: content.conditions.map((condition) => condition.text) },
    { kind: 'heading', text: orderPaper.cautionsHeading },
    ...cautionBlocks(paper),
    { kind: 'caution', level: 'stop-if', lines: [content.fields.stopIf] },
    { kind: 'heading', text: orderPaper.animalsHeading },
    animalsBlock(paper),
    { kind: 'heading', text: orderPaper.givenHeading },
    givenBlock(paper),
    ...noteBlocks(paper),
    ...aloneBlocks(paper),
    ...relationshipBlocks(paper),
  ]
}

/** What the check found, in a sentence. */
const faultBlocks = ({ block: { fault } }: OrderPaper): DocumentBlock[] =>
  fault === null ? [] : [{ kind: 'paragraph', text: [{ text: sayFault(fault), bold: true }] }]

/** In place of a text that is not the one signed, or not known to be that of the order: when to stop a bath that runs. */
const faultyStatements = ({ content }: OrderPaper): DocumentBlock[] => [
  { kind: 'paragraph', text: [{ text: faultWords.noFigures, bold: true }] },
  { kind: 'caution', level: 'stop-if', lines: [content.fields.stopIf] },
]

/** A signed order on paper. Everything comes from the signed text, and the check of that text stands on every page. */
export function orderDocument(paper: OrderPaper): PdfDocumentModel {
  const { content, block } = paper
  const notice = orderNotice({ ...paper, versionNo: content.versionNo })
  const usesMicrolitres = content.targetText.includes('L/L')
  const treated = content.water.animals.filter((animal) => animal.treated)
  return {
    title: orderPaper.title({ number: content.number, n: content.versionNo }),
    ...signedFrame(paper, notice),
    head: {
      facility: paper.facility,
      name: orderWords.order,
      number: content.number,
      version: orderPaper.version({ n: content.versionNo }),
      source: usesMicrolitres ? orderPaper.sourceMicrolitres : orderPaper.source,
      subject: {
        name: content.enclosure.code,
        lines: [content.enclosure.name, ...treated.slice(0, 3).map(sayTreated)],
      },
    },
    blocks: [
      ...faultBlocks(paper),
      ...(isTextSound(block.fault) ? statements(paper) : faultyStatements(paper)),
      { kind: 'signatures', entries: [signatureEntry(block)] },
      checkBlock(paper.publicUrl, block.hash),
      standingCaution(),
    ],
  }
}
