import { clearanceDocument } from '../../../server/features/quarantine/clearance-document.ts'
import type { ClearancePaper } from '../../../server/features/quarantine/clearance-document.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'

/** The signature under it, found in a state. */
export function signedBlock(state: SignatureBlock['state']): SignatureBlock {
  return {
    printedName: 'Dr Ilse Marrow',
    role: 'veterinarian',
    licence: { jurisdiction: 'Harrow County', number: 'VL-20417', validUntil: '2026-09-30' },
    registration: null,
    meaning: 'author of this clearance',
    signedAt: '2026-05-14T18:24:07.000Z',
    signedOn: '2026-05-14',
    zone: 'America/Halifax',
    hash: '7c1e40af92d30b15'.repeat(4),
    keyId: '0011223344556677',
    state,
    fault: state === 'broken' ? { what: 'text', entries: [] } : null,
  }
}

/** A clearance of a large batch against two conditions, with a long history. All of it is invented. */
export function clearanceLike(change: Partial<ClearancePaper> = {}, events = 6): PdfDocumentModel {
  return clearanceDocument({
    facility: 'Harrow Point Sea Hall',
    paper: 'a4',
    printedBy: 'S. Brandt',
    printedAt: '2026-05-14T18:33:00.000Z',
    recalled: false,
    block: signedBlock('intact'),
    content: {
      kind: 'quarantine-clearance',
      clockVersion: 1,
      eventId: '019a0000-0000-7000-8000-000000000001',
      caseId: '019a0000-0000-7000-8000-000000000002',
      number: 'Q-115',
      name: 'Kelp hall wrasse, second shipment',
      quarantineKind: 'fish',
      protocol: { code: 'QP-30', version: 2, name: 'Marine fish under copper', confirmed: true },
      clearedAt: '2026-05-14T18:24:07.000Z',
      clearedOn: '2026-05-14',
      zone: 'America/Halifax',
      day0On: '2026-04-14',
      dayNumber: 30,
      requiredDays: 30,
      pausedDays: 2,
      earliestClearanceOn: '2026-05-16',
      sharesWaterWith: ['Q-113', 'Q-116'],
      batch: [
        {
          accession: 'HP-0611',
          commonName: 'Corkwing wrasse',
          scientificName: 'Symphodus melops',
          houseName: null,
          enclosureCode: 'QT-3',
          joinedOn: '2026-04-12',
          count: { basis: 'estimated', low: 38, high: 44 },
        },
        {
          accession: 'HP-0612',
          commonName: 'Ballan wrasse',
          scientificName: 'Labrus bergylta',
          houseName: 'Old Tom',
          enclosureCode: 'QT-3',
          joinedOn: '2026-04-14',
          count: { basis: 'counted', low: 1, high: 1 },
        },
        {
          accession: 'HP-0613',
          commonName: 'Goldsinny wrasse',
          scientificName: 'Ctenolabrus rupestris',
          houseName: null,
          enclosureCode: null,
          joinedOn: '2026-04-14',
          count: { basis: 'counted', low: 0, high: 0 },
        },
      ],
      criteria: [
        { name: 'Two clean wet mounts', met: false, metOn: null, count: 1, wanted: 2 },
        { name: 'Feeding on its own', met: true, metOn: '2026-05-02', count: 0, wanted: 0 },
      ],
      clock: Array.from({ length: events }, (_, i) => ({
        code: 'no-restart-counted',
        on: '2026-04-20',
        text: `Entry ${i + 1}: wet rock from QT-1 on 20 Apr 2026 changes nothing.`,
        standing: i !== 1,
      })),
      deaths: [
        {
          on: '2026-04-21',
          count: 2,
          accession: 'HP-0613',
          finding: 'explained-not-transmissible',
          cause: 'caught in the outflow screen',
        },
        { on: '2026-04-25', count: 1, accession: null, finding: 'unexplained', cause: null },
      ],
      unmet: [
        {
          code: 'length-not-reached',
          params: { untilOn: '2026-05-16', daysLeft: 2, requiredDays: 30 },
          text: '30 days plus what was paused: until 16 May 2026, 2 days to run.',
        },
        {
          code: 'negatives-missing',
          params: { criterionId: 'wet-mounts', count: 1, wanted: 2, earliestSampleOn: '2026-05-15' },
          text: 'Two clean wet mounts: 1 of 2. A sample taken on 15 May 2026 or later can complete it.',
        },
      ],
      reason: 'The wing is closed for repair on Friday; they stay apart in the nursery until 20 May',
    },
    ...change,
  })
}
