import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { standingCaution } from '../../../server/platform/pdf/standing-caution.ts'
import { documentWords } from '../../../shared/messages/documents.ts'

/**
 * A reading-driven copper order of the fictional Harrow Point Sea Hall, as a builder of documents would make it.
 * All names and numbers are invented; nothing here is advice.
 */
export function orderLike(changes: Partial<PdfDocumentModel> = {}): PdfDocumentModel {
  return {
    title: 'Treatment order TO-0734, version 2',
    language: 'en',
    paper: 'a4',
    head: {
      facility: 'Harrow Point Sea Hall',
      name: 'Treatment order: bath',
      number: 'TO-0734',
      version: 'version 2',
      source: 'Volumes in litres, copper as free copper.',
      subject: {
        name: 'QT-3',
        flag: 'Q',
        lines: [
          '14 yellow tang',
          [{ text: 'Zebrasoma flavescens', italic: true }],
          'in quarantine, case Q-118',
        ],
      },
    },
    signers: ['Signed by Dr Ilse Marrow, 14 May 2026, 14:24:07, UTC−4'],
    recordCheck: '7C1E 40AF 92D3 0B15',
    printed: {
      by: 'S. Brandt',
      at: '14 May 2026, 14:33, UTC−4',
      atIso: '2026-05-14T18:33:00Z',
      note: documentWords.laterVersion,
    },
    blocks: [
      {
        kind: 'columns',
        divided: true,
        columns: [
          {
            share: 1,
            blocks: [
              {
                kind: 'amount',
                above: 'Step 1 of 3, from 0.00 mg/L read 14 May, 12:40',
                value: '0.44',
                unit: 'g',
                lines: [
                  [
                    { text: 'Copper sulfate pentahydrate', bold: true },
                    { text: ', powder, 99 %, lot CS-2411, expires Mar 2028, ' },
                    { text: 'into the water', bold: true },
                  ],
                ],
                limits: [
                  {
                    text: 'Steps 2 and 3 are worked out from the reading at the time. Largest single addition ',
                  },
                  { text: '0.6 g', bold: true },
                  { text: ', largest in 24 h ' },
                  { text: '0.9 g', bold: true },
                  { text: '.' },
                ],
              },
            ],
          },
          {
            share: 1.25,
            blocks: [
              {
                kind: 'grid',
                entries: [
                  { label: 'Problem', value: '2. White spot, gill mount 12 May' },
                  { label: 'Targets', value: 'step 1: 0.05, step 2: 0.1, step 3: 0.15 mg/L free copper' },
                  { label: 'Re-test', value: '12 h after each addition, before the next' },
                  { label: 'Then hold', value: '21 days, test copper twice daily' },
                  { label: 'How', value: 'dissolve in 2 L tank water, add over 20 min at the return' },
                  { label: 'Use', value: 'extralabel; not for food or release animals' },
                ],
              },
            ],
          },
        ],
      },
      { kind: 'rule' },
      {
        kind: 'columns',
        columns: [
          {
            share: 1,
            blocks: [
              { kind: 'heading', text: 'Volume, 2 Mar 2026: 2,220 L ± 2 %' },
              {
                kind: 'working',
                lines: [
                  { what: 'Tank', formula: '2.40 × 1.20 × 0.68 m', result: '1,958.4 L' },
                  { what: 'Displaced', formula: 'by bucket', result: '− 41.0 L' },
                  { what: 'Sump', formula: '1.10 × 0.60 × 0.40 m', result: '+ 264.0 L' },
                  { what: 'Pipes', formula: '0.7854 × 0.057² × 14.2 m', result: '+ 36.2 L' },
                  { what: 'Net', formula: 'unrounded', result: '2,217.6 L', total: true },
                ],
              },
            ],
          },
          {
            share: 1,
            blocks: [
              { kind: 'heading', text: 'Amount for step 1' },
              {
                kind: 'working',
                lines: [
                  { what: 'Rise', formula: '0.05 mg/L less 0.00 mg/L', result: '0.05 mg/L' },
                  { what: 'Copper', formula: '2,217.6 L × 0.05 mg/L', result: '110.9 mg' },
                  { what: 'Copper share', formula: '63.546 ÷ 249.685', result: '25.45 %' },
                  { what: 'Product', formula: '110.9 mg ÷ 0.2545', result: '0.4357 g' },
                  { what: 'At 99 %', formula: '0.4357 g ÷ 0.99', result: '0.44 g', total: true },
                ],
              },
            ],
          },
        ],
      },
      { kind: 'heading', text: 'Before each dose, true before the first gram' },
      {
        kind: 'conditions',
        columns: 2,
        items: [
          [{ text: 'Oxygen at least 6 mg/L,', bold: true }, { text: ' read within 30 min' }],
          [{ text: 'Free copper', bold: true }, { text: ' read within 2 h' }],
          [{ text: 'Carbon out.', bold: true }, { text: ' Off since 09:40 in the life-support log' }],
          [{ text: 'UV off.', bold: true }, { text: ' On at signing in the life-support log' }],
          [{ text: 'Second calculation', bold: true }, { text: ' by another person, on their own screen' }],
          [{ text: 'Valve to QS-B shut', bold: true }, { text: ' and tagged' }],
        ],
      },
      { kind: 'heading', text: 'Cautions' },
      {
        kind: 'caution',
        level: 'stop',
        title: 'Elasmobranchs on this water system',
        lines: ['QT-4 on QS-B holds 2 southern stingrays. Valve shut 09:40, one of two dye tests clear.'],
        override: [
          { text: 'Overridden by Dr I. Marrow 14:12,', bold: true },
          { text: ' reason: valve tagged and locked; a night’s wait would cost fish.' },
        ],
      },
      {
        kind: 'caution',
        level: 'warning',
        title: 'Copper goes to waste water',
        lines: ['Below 0.02 mg/L before the valve to QS-B is opened again.'],
      },
      { kind: 'caution', level: 'note', lines: ['Gloves, goggles and dust mask. Weigh under the hood.'] },
      {
        kind: 'caution',
        level: 'stop-if',
        lines: [
          'Free copper above 0.25 mg/L, breathing above 120 a minute, any fish lying on its side, or oxygen below 5 mg/L. Stop, then call Dr Marrow, extension 41.',
        ],
      },
      { kind: 'heading', text: 'Given' },
      {
        kind: 'table',
        columns: [
          { head: 'Step', share: 1 },
          { head: 'Not before', share: 1.4 },
          { head: 'Copper read, time', share: 1.6 },
          { head: 'Amount worked out', share: 1.6 },
          { head: 'Second calculation', share: 1.6 },
          { head: 'Weighed', share: 1.1 },
          { head: 'Time, given by', share: 1.5 },
        ],
        rows: ['1, to 0.05', '2, to 0.1', '3, to 0.15'].map((step, i) => [
          step,
          `${14 + i} May 15:00`,
          { pen: true, unit: 'mg/L' },
          { pen: true, unit: 'g' },
          { pen: true, unit: 'g' },
          { pen: true, unit: 'g' },
          { pen: true },
        ]),
        emptyText: 'No steps.',
      },
      {
        kind: 'signatures',
        entries: [
          {
            name: 'Dr Ilse Marrow',
            role: 'veterinarian',
            licence: 'licence VL-20417, valid to 30 Sep 2026',
            jurisdiction: 'Harrow County',
            meaning: 'Signed as author of this order',
            signedAt: '14 May 2026, 14:24:07, UTC−4',
            check: 'intact',
            checkWords: documentWords.recordIntact,
          },
          {
            name: 'Dr Ilse Marrow',
            role: 'veterinarian',
            licence: 'licence VL-20417, valid to 30 Sep 2026',
            jurisdiction: 'Harrow County',
            meaning: 'Signed the override of 1 stop',
            signedAt: '14 May 2026, 14:12:40, UTC−4',
            check: 'intact',
            checkWords: documentWords.recordIntact,
          },
        ],
      },
      standingCaution(),
    ],
    ...changes,
  }
}
