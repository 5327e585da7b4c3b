import type { PdfDocumentModel, DocumentBlock } from '../../../shared/domain/documents/pdf-document-model.ts'
import type { HistoryEvent } from '../../../shared/contracts/exports.contract.ts'
import { formatFingerprint } from '../../../shared/domain/documents/format-fingerprint.ts'
import {
  historyWords as words,
  identifierKindNames,
  lifeStageNames,
  sexNames,
} from '../../../shared/messages/history.ts'
import {
  custodyKindNames,
  permitKindNames,
  permitMarkNames,
} from '../../../shared/messages/register-kinds.ts'
import { sayDate, sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import {
  sayChange,
  sayCount,
  sayEventDetails,
  sayEventTitle,
  sayOrigin,
  sayPeriod,
  sayPlace,
  sayWhen,
} from '../../../shared/messages/say-history-event.ts'
import type { HistoryContent } from './read-history.ts'

export interface PrintFacts {
  facility: string
  zone: string
  paper: 'a4' | 'letter'
  printedBy: string
  printedAt: string
  /** SHA-256 of what the history says. */
  fingerprint: string
}

const groupsOf = (sha256: string, groups: number) => {
  const written = formatFingerprint(sha256, groups)
  if (!written.ok) throw new Error(`fingerprint ${sha256}: ${written.refusal.code}`)
  return written.value
}

function head(content: HistoryContent, facts: PrintFacts): DocumentBlock {
  const owner = content.owner ?? facts.facility
  return {
    kind: 'grid',
    columns: 2,
    entries: [
      { label: words.heldAs, value: words[content.heldAs] },
      { label: words.owner, value: owner },
      { label: words.since, value: content.since === null ? words.nothingYet : sayDate(content.since) },
      { label: words.place, value: sayPlace(content.place) ?? words.outside },
      { label: words.count, value: sayCount(content) },
      { label: words.period, value: sayPeriod(content) },
      { label: words.opening, value: String(content.opening) },
      { label: words.closing, value: String(content.closing) },
      { label: words.balance, value: words.balanceSentence(content) },
    ],
  }
}

/** The ports, the newest last, as a paper trail reads. */
function course(content: HistoryContent, facts: PrintFacts): DocumentBlock {
  const before = content.origins.map((origin) => {
    const { title, details } = sayOrigin(origin)
    return {
      when: origin.on === null ? '' : sayDate(origin.on),
      title,
      text: details.join('; '),
      state: 'made' as const,
    }
  })
  const ports = content.events.filter((event) => event.voided === null && event.found === null)
  return {
    kind: 'course',
    emptyText: words.noEvents,
    stops: [
      ...before,
      ...ports.map((event) => ({
        when: sayWhen(event, facts.zone),
        title: sayEventTitle(event),
        text: sayEventDetails(event).join(' '),
        aside: paperNames(event),
        state: 'made' as const,
      })),
    ],
  }
}

function paperNames(event: HistoryEvent): string {
  const names = [
    ...event.documents.filter((paper) => paper.voided === null).map((paper) => paper.title),
    ...event.permits.map((permit) => `${permitKindNames[permit.kind]} ${permit.permitNumber}`),
  ]
  return names.join('\n')
}

function ledger(content: HistoryContent, facts: PrintFacts): DocumentBlock {
  return {
    kind: 'table',
    columns: [
      { head: words.date, share: 1.4 },
      { head: words.event, share: 3.2 },
      { head: words.change, share: 0.8, align: 'right' },
      { head: words.after, share: 0.8, align: 'right' },
    ],
    rows: content.events.map((event) => [
      sayWhen(event, facts.zone),
      event.voided
        ? `${custodyKindNames[event.kind as keyof typeof custodyKindNames]}, ${words.struck({ reason: event.voided.reason })}`
        : sayEventTitle(event),
      event.voided ? words.struckTag : sayChange(event.delta),
      String(event.countAfter),
    ]),
    ...(content.events.length > 0
      ? { totals: ['', words.sum, sayChange(content.gained - content.lost) || '0', String(content.closing)] }
      : {}),
    emptyText: words.noEvents,
  }
}

function identifiers(content: HistoryContent): DocumentBlock {
  return {
    kind: 'table',
    columns: [
      { head: words.identifier, share: 1.6 },
      { head: words.value, share: 2 },
      { head: words.validFrom, share: 1 },
      { head: words.validUntil, share: 1 },
    ],
    rows: [
      [
        words.accessionNumber,
        [{ text: content.accession, bold: true }],
        content.since === null ? '' : sayDate(content.since),
        words.inUse,
      ],
      ...content.identifiers.map((mark) => [
        [identifierKindNames[mark.kind], mark.place].filter(Boolean).join(', '),
        [{ text: mark.value, bold: true }],
        sayDate(mark.from),
        mark.until === null ? words.inUse : sayDate(mark.until),
      ]),
    ],
    emptyText: words.noIdentifiers,
  }
}

function permits(content: HistoryContent): DocumentBlock {
  const uses = content.events.filter((event) => event.voided === null).flatMap((event) => event.permits)
  return {
    kind: 'table',
    columns: [
      { head: words.permit, share: 2.2 },
      { head: words.authority, share: 1.6 },
      { head: words.validity, share: 1.6 },
      { head: words.animalsTaken, share: 0.8, align: 'right' },
      { head: words.remarks, share: 1.6 },
    ],
    rows: uses.map((use) => [
      `${permitKindNames[use.kind]} ${use.permitNumber} (${use.number})`,
      use.authority,
      words.periodBoth({ from: use.validFrom, until: use.validUntil }),
      String(use.quantity),
      use.marks.length === 0 ? words.covered : use.marks.map((mark) => permitMarkNames[mark]).join('. '),
    ]),
    emptyText: words.noPermits,
  }
}

function papers(content: HistoryContent, facts: PrintFacts): DocumentBlock {
  const all = content.events.flatMap((event) => event.documents).filter((paper) => paper.voided === null)
  const once = [...new Map(all.map((paper) => [paper.id, paper])).values()]
  return {
    kind: 'table',
    columns: [
      { head: words.paper, share: 2 },
      { head: words.file, share: 2 },
      { head: words.check, share: 2 },
    ],
    rows: once.map((paper) => [
      `${paper.title}. ${words.recorded({ at: sayInstantWithOffset(paper.attachedAt, facts.zone), by: paper.attachedBy })}`,
      paper.fileName,
      groupsOf(paper.sha256, 4),
    ]),
    emptyText: words.noDocuments,
  }
}

/** The acquisition history as pages: custody, ledger with sums, marks, permits, papers, fingerprint. */
export function historyDocument(content: HistoryContent, facts: PrintFacts): PdfDocumentModel {
  const sex = content.form === 'individual' ? [sexNames[content.sex], lifeStageNames[content.lifeStage]] : []
  return {
    title: `${words.title} ${content.accession}`,
    language: 'en',
    paper: facts.paper,
    head: {
      facility: facts.facility,
      name: words.title,
      number: content.accession,
      version: words.entries({ count: content.events.length }),
      source: words.datesNote,
      subject: {
        name: content.name === null ? content.commonName : `${content.name}, ${content.commonName}`,
        lines: [
          [{ text: content.scientificName, italic: true }, { text: sex.map((one) => `, ${one}`).join('') }],
        ],
      },
    },
    signers: [],
    recordCheck: groupsOf(facts.fingerprint, 4),
    printed: {
      by: facts.printedBy,
      at: sayInstantWithOffset(facts.printedAt, facts.zone),
      atIso: facts.printedAt,
    },
    blocks: [
      head(content, facts),
      { kind: 'heading', text: words.custody, aside: words.entries({ count: content.events.length }) },
      course(content, facts),
      { kind: 'heading', text: words.ledger },
      ledger(content, facts),
      { kind: 'heading', text: words.identifiers },
      identifiers(content),
      { kind: 'heading', text: words.permits },
      permits(content),
      { kind: 'heading', text: words.documents },
      papers(content, facts),
      {
        kind: 'fingerprint',
        label: words.fingerprint,
        fingerprint: groupsOf(facts.fingerprint, 16),
        lookUp: words.lookUp,
      },
      {
        kind: 'paragraph',
        size: 'small',
        text: [{ text: `${words.standing}. `, bold: true }, { text: words.standingText }],
      },
    ],
  }
}
