import type { DocumentBlock, PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'

/** An acquisition history of the fictional Harrow Point Sea Hall; `events` ledger rows make it as long as a test needs. */
export function historyLike(events = 120, changes: Partial<PdfDocumentModel> = {}): PdfDocumentModel {
  return {
    title: 'Acquisition history HP-0388',
    language: 'en',
    paper: 'letter',
    head: {
      facility: 'Harrow Point Sea Hall',
      name: 'Acquisition history',
      number: 'HP-0388',
      source: 'One animal, 9 Aug 2019 to 14 May 2026. Dates as calendar dates of the facility.',
      subject: {
        name: 'Diamondback terrapin',
        flag: 'Q',
        lines: [
          [{ text: 'Malaclemys terrapin', italic: true }, { text: ', female' }],
          'in quarantine, case Q-109',
        ],
      },
    },
    signers: [],
    recordCheck: 'A04C 77E2 19BD 5F30',
    printed: { by: 'J. Pell', at: '14 May 2026, 14:20, UTC−4', atIso: '2026-05-14T18:20:00Z' },
    blocks: [
      {
        kind: 'grid',
        columns: 2,
        entries: [
          { label: 'Held as', value: 'on loan in, from Ledder Bay Marsh Trust' },
          { label: 'In collection since', value: '14 Mar 2026' },
          { label: 'Owner', value: 'Ledder Bay Marsh Trust' },
          { label: 'May be moved', value: 'not before clearance' },
          { label: 'Permits on file', value: '3 of 4, one runs out in 12 days' },
          { label: 'Water temperature', value: '23.4 °C ± 0.2 °C' },
        ],
      },
      { kind: 'flag-line', flag: 'N', text: 'Not cleared, day 61 of 30' },
      { kind: 'heading', text: 'Acquisition history', aside: '4 entries' },
      {
        kind: 'course',
        emptyText: 'No transactions on record.',
        stops: [
          {
            when: 'Today',
            state: 'ahead',
            title: 'Waits for clearance, then shore tank TP-2',
            text: 'Move 0118, planned. A veterinarian clears Q-109 from quarantine first.',
            aside: 'no paper yet',
          },
          {
            when: '14 Mar 2026',
            state: 'made',
            title: 'Received at Harrow Point Sea Hall',
            text: 'Acquisition 2026-017, loan in, three animals. Carrier Norrell Live Freight, box sealed 08:10, opened 13:25, 0 dead. Weight 0.61 kg.',
            aside: 'Loan agreement LA-26-04\nHealth certificate\nTransport notice',
          },
          {
            when: '2 Nov 2023',
            state: 'doubtful',
            title: 'Transferred to Ledder Bay Marsh Trust',
            text: 'Previous holder Point Ansel Hatchery. Their number PA-2231. Owner changed the same day.',
            aside: 'Transfer form\nHolding permit, ends 26 May 2026',
          },
          {
            when: '9 Aug 2019',
            state: 'made',
            title: 'Hatched at Point Ansel Hatchery',
            text: 'From clutch PA-C-77, dam PA-0410, sire not known. Source code C, bred in captivity.',
            aside: 'Hatch record, copy',
          },
        ],
      },
      { kind: 'heading', text: 'Passage through quarantine' },
      passage(),
      { kind: 'heading', text: 'Identifiers' },
      {
        kind: 'table',
        columns: [
          { head: 'Identifier', share: 2 },
          { head: 'Value', share: 2 },
          { head: 'Valid from', share: 1 },
          { head: 'Valid to', share: 1 },
          { head: 'Given by', share: 1.5 },
        ],
        rows: [
          ['Accession number', [{ text: 'HP-0388', bold: true }], '14 Mar 2026', 'in use', 'Harrow Point'],
          [
            'PIT tag, ISO 11784',
            [{ text: '999 000 000 038 811', bold: true }],
            '3 Sep 2020',
            'in use',
            'Point Ansel',
          ],
          ['Shell notch', [{ text: 'R1, L3', bold: true }], '9 Aug 2019', 'in use', 'Point Ansel'],
        ],
        emptyText: 'No identifiers on record.',
      },
      { kind: 'heading', text: 'Count ledger' },
      {
        kind: 'table',
        columns: [
          { head: 'No.', share: 0.6, align: 'right' },
          { head: 'Date', share: 1.2 },
          { head: 'What happened', share: 3 },
          { head: 'Change', share: 0.8, align: 'right' },
          { head: 'Count', share: 0.8, align: 'right' },
        ],
        rows: Array.from({ length: events }, (_, i) => [
          `${i + 1}`,
          `2026-${String(1 + (i % 9)).padStart(2, '0')}-11`,
          i % 7 === 0
            ? 'Counted by Zoé Ångström-Łukasiewicz, lagoon side'
            : `Entry ${i + 1}, moved within the wing`,
          i % 3 === 0 ? '+ 2' : '− 1',
          `${countAfter(i + 1)}`,
        ]),
        ...(events > 0
          ? {
              totals: [
                '',
                '',
                'Sum of the ledger',
                signed(countAfter(events) - 199),
                `${countAfter(events)}`,
              ],
            }
          : {}),
        emptyText: 'No entries in this period.',
      },
      {
        kind: 'fingerprint',
        label: 'Fingerprint of this history',
        fingerprint: 'A04C 77E2 19BD 5F30 8812 6D0E 43FA 90C7 1B5E 2A99 D3C0 7F48 66A1 0E2D B894 C35F',
        lookUp: 'Look it up at /check to see whether a later version exists.',
      },
    ],
    ...changes,
  }
}

/** The ledger opens at 199; every third entry adds 2, the others take 1 away. */
function countAfter(entries: number): number {
  const additions = Math.ceil(entries / 3)
  return 199 + 2 * additions - (entries - additions)
}

function signed(change: number): string {
  return change < 0 ? `−\u00a0${-change}` : `+\u00a0${change}`
}

/** Two legs and a restart, in the geometry of the board's rows. */
function passage(): DocumentBlock {
  return {
    kind: 'drawing',
    width: 660,
    height: 66,
    alt: 'Day 19 of 30. Restarted on 25 April because a fourth ray entered the same water. 2 steps done, 1 due, 1 to come.',
    marks: [
      { mark: 'line', from: [10, 20], to: [190, 20], weight: 1.2, tone: 'hair' },
      { mark: 'circle', at: [60, 20], radius: 4.6, filled: true },
      { mark: 'line', from: [190, 13], to: [186, 27], weight: 1.6 },
      { mark: 'line', from: [193, 13], to: [189, 27], weight: 1.6 },
      { mark: 'text', at: [200, 16], text: 'restarted 25 Apr', size: 11 },
      { mark: 'line', from: [190, 40], to: [410, 40], weight: 2 },
      { mark: 'line', from: [410, 40], to: [560, 40], weight: 1.2, dash: [5, 4] },
      { mark: 'circle', at: [250, 40], radius: 5.5, filled: true },
      { mark: 'circle', at: [410, 40], radius: 6.5, weight: 2.4 },
      { mark: 'circle', at: [490, 40], radius: 5.5, weight: 1.4 },
      { mark: 'cross', at: [330, 40], arm: 5, weight: 2.2 },
      { mark: 'flag', at: [580, 30], side: 16, flag: 'L' },
      { mark: 'text', at: [602, 43], text: 'Held', size: 13, bold: true },
      { mark: 'text', at: [410, 62], text: '14 May', size: 11, anchor: 'middle' },
      { mark: 'text', at: [560, 62], text: '25 May', size: 11, anchor: 'end' },
    ],
  }
}
