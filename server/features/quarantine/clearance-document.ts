import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import type {
  DocumentBlock,
  PdfDocumentModel,
  RichText,
} from '../../../shared/domain/documents/pdf-document-model.ts'
import { clearanceWords as words } from '../../../shared/messages/clearance.ts'
import { sayFaultNotice } from '../../../shared/messages/record-fault.ts'
import { documentWords } from '../../../shared/messages/documents.ts'
import { quarantineKindWords } from '../../../shared/messages/quarantine.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { signedFrame } from '../../platform/pdf/signed-frame.ts'
import { signatureEntry } from '../../platform/pdf/signature-entry.ts'
import type { ClearanceContent } from './clearance-content.ts'

export interface ClearancePaper {
  content: ClearanceContent
  block: SignatureBlock
  /** A result of a sample taken before clearance came back positive. */
  recalled: boolean
  facility: string
  paper: 'a4' | 'letter'
  printedBy: string
  printedAt: string
}

/** A state of the clearance that no page may hide; null while it holds. */
function noticeOf({ block, recalled }: ClearancePaper): string | null {
  if (block.state !== 'intact')
    return block.fault ? sayFaultNotice(block.fault) : documentWords.recordUnknownKey
  return recalled ? words.recalled : null
}

function particulars({ content }: ClearancePaper): DocumentBlock {
  const { protocol, dayNumber, requiredDays, sharesWaterWith } = content
  return {
    kind: 'grid',
    columns: 2,
    entries: [
      {
        label: words.protocol,
        value: words.protocolText(protocol) + (protocol.confirmed ? '' : words.protocolUnconfirmed),
      },
      { label: words.kind, value: quarantineKindWords[content.quarantineKind] },
      { label: words.day0, value: content.day0On === null ? words.noDay0 : sayDate(content.day0On) },
      { label: words.days, value: words.daysText({ ran: dayNumber ?? 0, wanted: requiredDays }) },
      { label: words.paused, value: words.pausedText({ days: content.pausedDays }) },
      {
        label: words.shares,
        value: sharesWaterWith.length === 0 ? words.sharesNone : sharesWaterWith.join(', '),
      },
    ],
  }
}

function countText(count: ClearanceContent['batch'][number]['count']): string {
  if (count.high === 0) return words.gone
  return count.basis === 'counted' ? words.countCounted({ count: count.high }) : words.countEstimated(count)
}

function batchTable({ content }: ClearancePaper): DocumentBlock {
  return {
    kind: 'table',
    columns: [
      { head: words.accession, share: 1.1 },
      { head: words.animal, share: 3 },
      { head: words.count, share: 1.1 },
      { head: words.place, share: 1 },
      { head: words.joined, share: 1.1 },
    ],
    rows: content.batch.map((one) => [
      one.accession,
      [
        { text: `${one.houseName === null ? one.commonName : `${one.commonName}, ${one.houseName}`} ` },
        { text: one.scientificName, italic: true },
      ],
      countText(one.count),
      one.enclosureCode ?? '',
      sayDate(one.joinedOn),
    ]),
    emptyText: words.noAnimals,
  }
}

/** What was not met, each with the reason why it was cleared all the same. */
function unmetBlocks({ content, block }: ClearancePaper): DocumentBlock[] {
  const reason = content.reason
  if (content.unmet.length === 0)
    return [
      { kind: 'paragraph', text: words.unmetNone },
      ...(reason === null ? [] : [{ kind: 'paragraph' as const, text: words.note({ reason }) }]),
    ]
  const override: RichText = [
    { text: words.against({ name: block.printedName }), bold: true },
    { text: words.reason({ reason: reason ?? '' }) },
  ]
  return content.unmet.map(({ text }) => ({
    kind: 'caution',
    level: 'warning',
    title: words.unmetTitle,
    lines: [text],
    override,
  }))
}

function conditionsTable({ content }: ClearancePaper): DocumentBlock {
  return {
    kind: 'table',
    columns: [
      { head: words.condition, share: 3 },
      { head: words.result, share: 2 },
    ],
    rows: content.criteria.map(({ name, met, metOn, count, wanted }) => [
      name,
      (met ? (metOn === null ? words.met : words.metOn({ on: sayDate(metOn) })) : words.notMet) +
        (wanted > 0 ? words.negatives({ count, wanted, met }) : ''),
    ]),
    emptyText: words.noConditions,
  }
}

function clockTable({ content }: ClearancePaper): DocumentBlock {
  return {
    kind: 'table',
    columns: [
      { head: words.date, share: 1 },
      { head: words.what, share: 5 },
    ],
    rows: content.clock.map(({ on, text, standing }) => [
      sayDate(on),
      standing ? text : [{ text }, { text: words.fallen, tone: 'second' }],
    ]),
    emptyText: words.noClock,
  }
}

function deathsTable({ content }: ClearancePaper): DocumentBlock {
  return {
    kind: 'table',
    columns: [
      { head: words.found, share: 1 },
      { head: words.accession, share: 1 },
      { head: words.bodies, share: 0.8 },
      { head: words.finding, share: 3.2 },
    ],
    rows: content.deaths.map(({ on, accession, count, finding, cause }) => [
      sayDate(on),
      accession ?? words.nobody,
      words.countCounted({ count }),
      cause === null ? words[finding] : words.findingText({ finding: words[finding], cause }),
    ]),
    emptyText: words.noDeaths,
  }
}

/** A clearance on paper. Everything comes from the signed text, and the check of that text stands on every page. */
export function clearanceDocument(paper: ClearancePaper): PdfDocumentModel {
  const { content, block } = paper
  const notice = noticeOf(paper)
  const flag = notice === null ? 'C' : 'N'
  const low = content.batch.reduce((sum, one) => sum + one.count.low, 0)
  const high = content.batch.reduce((sum, one) => sum + one.count.high, 0)
  return {
    title: words.title({ number: content.number }),
    ...signedFrame(paper, notice, content.zone),
    head: {
      facility: paper.facility,
      name: words.name,
      number: content.number,
      source: words.source({ zone: content.zone }),
      subject: { name: content.name, flag, lines: [words.animals({ low, high })] },
    },
    blocks: [
      {
        kind: 'flag-line',
        flag,
        text: notice === null ? words.cleared({ on: sayDate(content.clearedOn) }) : words.notValid,
      },
      particulars(paper),
      { kind: 'rule' },
      { kind: 'heading', text: words.batchHeading },
      batchTable(paper),
      { kind: 'heading', text: words.unmetHeading },
      ...unmetBlocks(paper),
      { kind: 'heading', text: words.conditionsHeading },
      conditionsTable(paper),
      { kind: 'heading', text: words.clockHeading },
      clockTable(paper),
      { kind: 'heading', text: words.deathsHeading },
      deathsTable(paper),
      { kind: 'signatures', entries: [signatureEntry(block)] },
      { kind: 'fingerprint', label: documentWords.fingerprintInFull, fingerprint: block.hash },
      { kind: 'paragraph', size: 'small', text: words.scope },
    ],
  }
}
