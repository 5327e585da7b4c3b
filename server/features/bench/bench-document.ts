import { curveOf } from '../../../shared/bench/curve.ts'
import type { CurveAxis } from '../../../shared/bench/curve.ts'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { BenchAnswer } from '../../../shared/bench/evaluate.ts'
import { formatCell, formatFigure, formatRange, formatWorking } from '../../../shared/bench/present.ts'
import { axisName, fewerPoints, sayAcross, sayUp } from '../../../shared/bench/say-curve.ts'
import { sayInputs } from '../../../shared/bench/say-inputs.ts'
import { say, sayCaution, sayLine } from '../../../shared/bench/words.ts'
import type { DocumentBlock, PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { sources } from '../../../shared/domain/sources.ts'
import type { Zone } from '../../../shared/domain/time/instant.ts'
import { benchPaper } from '../../../shared/messages/bench-paper.ts'
import { benchPlotWords } from '../../../shared/messages/bench-plot.ts'
import { sourceMarks } from '../../../shared/messages/bench-sheet.ts'
import { sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { standingCaution } from '../../platform/pdf/standing-caution.ts'

export interface BenchPaper {
  of: AnyCalculator
  /** What the calculator was asked, as it came. */
  body: unknown
  answer: BenchAnswer
  facility: string
  zone: Zone
  paper: 'a4' | 'letter'
  printedBy: string
  /** ISO 8601 */
  printedAt: string
}

function resultBlocks({ of, answer }: BenchPaper): DocumentBlock[] {
  const [result, ...others] = answer.figures
  const { number, symbol } = formatFigure(result)
  const ends = answer.range && formatRange(answer.range, result)
  const amount: DocumentBlock = {
    kind: 'amount',
    above: [{ text: say(of, `result.${result.key}`), bold: true }],
    value: number,
    unit: symbol,
    lines: [],
    ...(ends ? { limits: benchPaper.range({ low: ends.low.text, high: ends.high.text }) } : {}),
  }
  if (others.length === 0) return [amount]
  const entries = others.map((figure) => ({
    label: say(of, `result.${figure.key}`),
    value: formatFigure(figure).text,
  }))
  return [amount, { kind: 'grid', entries }]
}

function inputBlocks({ of, body }: BenchPaper): DocumentBlock[] {
  const entries = sayInputs(of, body).map(({ what, text }) => ({ label: what, value: text }))
  return [
    { kind: 'heading', text: benchPaper.asked },
    { kind: 'grid', entries },
  ]
}

function workingBlocks({ of, answer }: BenchPaper): DocumentBlock[] {
  const lines = formatWorking(answer).map(({ line, formula, result, isResult }) => ({
    what: sayLine(of, line),
    formula,
    result: result.text,
    total: isResult,
  }))
  return [
    { kind: 'heading', text: benchPaper.working },
    { kind: 'working', lines },
    { kind: 'paragraph', size: 'small', text: say(of, 'formula') },
  ]
}

function scheduleBlocks({ of, answer: { schedule } }: BenchPaper): DocumentBlock[] {
  if (!schedule) return []
  return [
    { kind: 'heading', text: benchPaper.schedule },
    {
      kind: 'table',
      columns: schedule.columns.map(({ key }) => ({
        head: say(of, `column.${key}`),
        share: 1,
        align: 'right',
      })),
      rows: schedule.rows.map((row) =>
        schedule.columns.map((column, i) => formatCell(row[i] ?? 0, column).text),
      ),
      emptyText: benchPaper.noSteps,
    },
  ]
}

/** Points of a curve that one line of a table has room for. */
const mostPoints = 8

/** What the result would be with another value of one input. The curve of a plan is its steps, which stand above. */
function curveBlocks({ of, body }: BenchPaper): DocumentBlock[] {
  const curve = curveOf(of, body)
  if (!curve || curve.steps) return []
  const name = (axis: CurveAxis) => axisName(of, { ...axis, scale: 'even' })
  const points = fewerPoints(curve, mostPoints)
  return [
    { kind: 'heading', text: benchPlotWords.heading },
    {
      kind: 'table',
      columns: [
        { head: name(curve.across), share: 2.4, align: 'left' },
        ...points.map((point) => {
          const across = sayAcross(curve, point).number
          const head = point.own ? benchPlotWords.ownPoint({ across }) : across
          const share = point.own ? 1.7 : 1
          return { head, share, align: 'right' as const }
        }),
      ],
      rows: [
        [name(curve.up), ...points.map((point) => sayUp(curve, point)?.number ?? benchPlotWords.noAnswer)],
      ],
      emptyText: benchPlotWords.noAnswer,
    },
  ]
}

function cautionBlocks({ of, answer: { cautions } }: BenchPaper): DocumentBlock[] {
  if (cautions.length === 0) return []
  const gravest = [...cautions].sort((a, b) => Number(a.level === 'note') - Number(b.level === 'note'))
  return [
    { kind: 'heading', text: benchPaper.cautions },
    ...gravest.map((one): DocumentBlock => ({
      kind: 'caution',
      level: one.level,
      lines: [sayCaution(of, one)],
    })),
  ]
}

const sourceBlocks = ({ answer }: BenchPaper): DocumentBlock[] => [
  { kind: 'heading', text: benchPaper.sources },
  ...answer.sources.map((key): DocumentBlock => {
    const { citation, mark } = sources[key]
    return {
      kind: 'paragraph',
      size: 'small',
      text: benchPaper.sourceLine({ citation, mark: sourceMarks[mark] }),
    }
  }),
]

/** A question to the bench with its answer on paper. Every page says that it is no order and that nobody signed it. */
export function benchDocument(paper: BenchPaper): PdfDocumentModel {
  const name = say(paper.of, 'name')
  return {
    title: benchPaper.title({ name }),
    language: 'en',
    paper: paper.paper,
    head: { facility: paper.facility, name: benchPaper.title({ name }), source: say(paper.of, 'purpose') },
    signers: [],
    notice: benchPaper.notice,
    printed: {
      by: paper.printedBy,
      at: sayInstantWithOffset(paper.printedAt, paper.zone),
      atIso: paper.printedAt,
      note: benchPaper.notKept,
    },
    blocks: [
      {
        kind: 'columns',
        divided: true,
        columns: [
          { share: 1, blocks: resultBlocks(paper) },
          { share: 1.25, blocks: inputBlocks(paper) },
        ],
      },
      { kind: 'rule' },
      // what has to be heeded stands on the first page, however long the working is
      ...cautionBlocks(paper),
      ...workingBlocks(paper),
      ...scheduleBlocks(paper),
      ...curveBlocks(paper),
      ...sourceBlocks(paper),
      standingCaution(),
    ],
  }
}
