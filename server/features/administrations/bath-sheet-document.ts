import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import type {
  CautionBlock,
  DocumentBlock,
  PdfDocumentModel,
} from '../../../shared/domain/documents/pdf-document-model.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { bathPaper } from '../../../shared/messages/bath-paper.ts'
import { doseWords } from '../../../shared/messages/doses.ts'
import { basisNames } from '../../../shared/messages/formulary.ts'
import { restInTheWay, sayObstacle } from '../../../shared/messages/in-the-way.ts'
import { orderPaper } from '../../../shared/messages/orders.ts'
import { sayDoNotDose } from '../../../shared/messages/record-fault.ts'
import { sayInstant } from '../../../shared/messages/say-date.ts'
import { workingBlock } from '../../platform/pdf/working-block.ts'
import { mostInOneEdge, oneCauseBlocks } from '../../platform/pdf/grouped-cautions.ts'
import { signedFrame } from '../../platform/pdf/signed-frame.ts'
import { standingCaution } from '../../platform/pdf/standing-caution.ts'
import { checkBlock } from '../../platform/pdf/check-block.ts'
import { signatureEntry } from '../../platform/pdf/signature-entry.ts'
import type { SignedOrder } from '../orders/index.ts'
import { bathBlocks, calculationBlocks, isForSecond } from './bath-paper-records.ts'

type SheetCaution = BathSheet['cautions'][number]

export interface BathPaper {
  /** As the person at the tank sees it now, with every amount. */
  sheet: BathSheet
  content: SignedOrder
  block: SignatureBlock
  /** A state of the order that no page may hide; null when doses may be given from it. */
  notice: string | null
  facility: string
  publicUrl: string
  paper: 'a4' | 'letter'
  printedBy: string
  printedAt: string
}

const percentText = (value: number) => formatDose(Number(value.toFixed(1)), 'percent').text.replace(/^-/, '−')

/** What was signed beside what is worked out now; never one number. */
function amountLimits({ sheet, content }: BathPaper): string {
  if (sheet.signedAmountText === sheet.amountNowText && !sheet.driftPercent) return bathPaper.sameAmount
  const signed = bathPaper.signedAmount({ amount: sheet.signedAmountText ?? '' })
  if (sheet.driftPercent === null) return signed
  const drift = bathPaper.drift({
    percent: percentText(sheet.driftPercent),
    allowed: formatDose(content.fields.allowedVolumeDriftPercent, 'percent').text,
  })
  return `${signed} ${drift}`
}

function amountBlock(paper: BathPaper): DocumentBlock {
  const { sheet, content, block } = paper
  if (!sheet.amountNow) {
    const text = sheet.record === 'intact' ? bathPaper.noAmount : sayDoNotDose(sheet.recordFault)
    return { kind: 'paragraph', text: [{ text, bold: true }] }
  }
  const { number, symbol } = formatDose(sheet.amountNow.value, sheet.amountNow.unit as UnitCode)
  const { strength, strengthBasis } = content.product
  return {
    kind: 'amount',
    above: bathPaper.amountAbove({ at: sayInstant(sheet.now, block.zone) }),
    value: number,
    unit: symbol,
    lines: [
      [
        { text: sheet.drug, bold: true },
        { text: ` (${sheet.productName}), ` },
        {
          text: bathPaper.strength({
            strength: formatDose(strength.value, strength.unit as UnitCode).text,
            basis: basisNames[strengthBasis as keyof typeof basisNames],
          }),
        },
        { text: bathPaper.into, bold: true },
      ],
    ],
    limits: amountLimits(paper),
  }
}

function particulars({ sheet, block }: BathPaper): DocumentBlock {
  const at = (instant: string) => sayInstant(instant, block.zone)
  const own = sheet.calendar.find((dose) => dose.key === sheet.key)
  return {
    kind: 'grid',
    entries: [
      {
        label: bathPaper.dose,
        value: bathPaper.doseText({ key: sheet.key, doses: sheet.doses, due: at(sheet.dueAt) }),
      },
      ...(own
        ? [
            {
              label: bathPaper.window,
              value: bathPaper.windowText({ opens: at(own.opensAt), closes: at(own.latestAt) }),
            },
          ]
        : []),
      { label: bathPaper.target, value: sheet.targetText },
      {
        label: bathPaper.contact,
        value: sheet.contactMinutes === null ? bathPaper.left : formatDose(sheet.contactMinutes, 'min').text,
      },
      { label: bathPaper.animals, value: sheet.treated.join('; ') },
      ...(sheet.instructions === '' ? [] : [{ label: bathPaper.how, value: sheet.instructions }]),
    ],
  }
}

function conditionsBlock({ sheet }: BathPaper): DocumentBlock {
  const states = { met: bathPaper.met, unmet: bathPaper.unmet, unknown: bathPaper.unknown }
  return {
    kind: 'conditions',
    columns: 2,
    items: sheet.steps.map((step) => [
      { text: step.changed.length > 0 ? `${step.text}. ${step.changed.join(' ')}` : step.text },
      {
        text: `${states[step.state]}${step.overridden ? bathPaper.overridden : ''}`,
        bold: step.state !== 'met',
        tone: 'second',
      },
    ]),
  }
}

const listed = (heading: string, blocks: DocumentBlock[]): DocumentBlock[] =>
  blocks.length === 0 ? [] : [{ kind: 'heading', text: heading }, ...blocks]

const standsInTheWay = (sheet: BathSheet, caution: SheetCaution) => sheet.why.includes(sayObstacle(caution))

const cautionLine = ({ title, text }: SheetCaution) => [
  { text: `${title}.`, bold: true },
  { text: ` ${text}` },
]

const overriddenBy = ({ overridden }: SheetCaution) =>
  overridden
    ? [
        { text: orderPaper.overridden({ name: overridden.by }), bold: true },
        { text: orderPaper.reason({ reason: overridden.reason }) },
      ]
    : undefined

/** Those of one cause together; else neighbours of one level in one edge, so that an ordinary dose has them all on the page of its amount. */
function cautionBlocks(cautions: readonly SheetCaution[]): DocumentBlock[] {
  const blocks: CautionBlock[] = []
  let joins = false
  for (const { lead, members } of groupSaid(cautions)) {
    const before = blocks.at(-1)
    const override = overriddenBy(lead)
    const line = cautionLine(lead)
    const isAlone = members.length === 1
    if (!isAlone) blocks.push(...oneCauseBlocks(members, overriddenBy))
    else if (override) blocks.push({ kind: 'caution', level: lead.level, lines: [line], override })
    else if (joins && before?.level === lead.level && before.lines.length < mostInOneEdge)
      blocks[blocks.length - 1] = { ...before, lines: [...before.lines, line] }
    else blocks.push({ kind: 'caution', level: lead.level, lines: [line] })
    joins = isAlone && override === undefined
  }
  return blocks
}

/** What stands in the way; a stop among it in its own look, and not a second time below. */
function obstacleBlocks(sheet: BathSheet): DocumentBlock[] {
  return [
    ...restInTheWay(sheet).map((text): DocumentBlock => ({
      kind: 'paragraph',
      text: [{ text, bold: true }],
    })),
    ...cautionBlocks(sheet.cautions.filter((caution) => standsInTheWay(sheet, caution))),
  ]
}

/** Every line that the screen shows, and what the balance makes of the last. */
function workingBlocks({ working, roundingText }: BathSheet): DocumentBlock[] {
  if (working.length === 0) return []
  return [
    workingBlock(working),
    ...(roundingText === null ? [] : [{ kind: 'paragraph' as const, text: roundingText }]),
  ]
}

/** No second person calculated it: whoever doses from the page is told. */
const aloneBlock = ({ sheet }: BathPaper): DocumentBlock[] => {
  const alone = sheet.second?.aloneText ?? null
  return alone === null
    ? []
    : [{ kind: 'caution', level: 'warning', title: doseWords.calculatedAlone, lines: [alone] }]
}

/** One dose on paper for the tank: what to weigh and why, what has to be true, when to stop, and lines for the pen. */
export function bathSheetDocument(paper: BathPaper): PdfDocumentModel {
  const { sheet, content, block } = paper
  const notice = paper.notice ?? (sheet.why.length > 0 ? bathPaper.notReady : null)
  return {
    title: bathPaper.title({ number: sheet.number, dose: sheet.key }),
    ...signedFrame(paper, notice),
    head: {
      facility: paper.facility,
      name: bathPaper.name,
      number: sheet.number,
      version: bathPaper.version({ n: sheet.versionNo, dose: sheet.key, doses: sheet.doses }),
      source: content.targetText.includes('L/L') ? orderPaper.sourceMicrolitres : orderPaper.source,
      subject: { name: sheet.enclosureCode, lines: [sheet.enclosureName, ...sheet.treated.slice(0, 3)] },
    },
    blocks: [
      {
        kind: 'columns',
        divided: true,
        columns: [
          { share: 1, blocks: [amountBlock(paper)] },
          { share: 1.25, blocks: [particulars(paper)] },
        ],
      },
      { kind: 'rule' },
      { kind: 'caution', level: 'stop-if', lines: [sheet.stopIf] },
      ...aloneBlock(paper),
      ...listed(bathPaper.inTheWay, obstacleBlocks(sheet)),
      ...listed(bathPaper.conditions, sheet.steps.length > 0 ? [conditionsBlock(paper)] : []),
      ...listed(bathPaper.working, workingBlocks(sheet)),
      ...listed(
        bathPaper.cautions,
        cautionBlocks(sheet.cautions.filter((caution) => !standsInTheWay(sheet, caution))),
      ),
      ...listed(
        bathPaper.overrides,
        sheet.overrides.map(({ title, text, reason, signature }) => ({
          kind: 'caution',
          level: 'stop',
          title,
          lines: [text],
          override: [
            {
              text: bathPaper.overriddenBy({
                name: signature.printedName,
                licence: signature.licence?.number ?? '',
                at: sayInstant(signature.signedAt, signature.zone),
              }),
              bold: true,
            },
            { text: orderPaper.reason({ reason }) },
          ],
        })),
      ),
      // a page of its own, without the amount, that can be handed to the second person as long as there is to be one
      ...(isForSecond(sheet) ? [{ kind: 'page-break' } as const] : []),
      { kind: 'group', blocks: calculationBlocks({ sheet, zone: block.zone }) },
      { kind: 'group', blocks: bathBlocks({ sheet, zone: block.zone }) },
      {
        kind: 'signatures',
        entries: [
          signatureEntry(block),
          ...sheet.overrides.map(({ signature }) => signatureEntry(signature)),
        ],
      },
      checkBlock(paper.publicUrl, block.hash, bathPaper.fingerprint),
      standingCaution(),
    ],
  }
}
