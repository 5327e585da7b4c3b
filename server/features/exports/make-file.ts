import { buffer } from 'node:stream/consumers'
import type { ExportFormat } from '../../../shared/domain/register/export-formats.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { csvStream } from '../../platform/csv/csv-stream.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import { drawable } from '../../platform/pdf/drawable.ts'
import { historyCsv } from './history-csv.ts'
import { historyDarwinCore } from './history-darwin-core.ts'
import { historyDocument } from './history-document.ts'
import type { PrintFacts } from './history-document.ts'
import type { HistoryContent } from './read-history.ts'

export interface MadeFile {
  content: Uint8Array
  mediaType: string
  fileName: string
}

const csvType = 'text/csv; charset=utf-8'

/** A history as one file in one of its forms. */
export async function makeHistoryFile(
  content: HistoryContent,
  format: ExportFormat,
  facts: PrintFacts,
  pdf: PdfPool,
): Promise<MadeFile> {
  const name = `${content.accession}-${facilityDateOf(facts.printedAt, facts.zone)}`.replace(/[^\w.-]+/g, '-')
  const table = async (made: Parameters<typeof csvStream>[0]) => new Uint8Array(await buffer(csvStream(made)))
  switch (format) {
    case 'pdf': {
      const bytes = await pdf.renderPdf(historyDocument(drawable(content), facts))
      return { content: bytes, mediaType: 'application/pdf', fileName: `${name}.pdf` }
    }
    case 'csv':
      return {
        content: await table(historyCsv(content, facts.zone, 'literal')),
        mediaType: csvType,
        fileName: `${name}.csv`,
      }
    case 'csv-guarded':
      return {
        content: await table(historyCsv(content, facts.zone, 'guarded')),
        mediaType: csvType,
        fileName: `${name}-spreadsheet.csv`,
      }
    case 'darwin-core':
      return {
        content: await table(historyDarwinCore(content, facts.facility, facts.zone)),
        mediaType: csvType,
        fileName: `${name}-darwin-core.csv`,
      }
    case 'json': {
      const { facility, zone, printedBy, printedAt, fingerprint } = facts
      const text = JSON.stringify(
        {
          format: 'pratique-acquisition-history',
          version: 1,
          facility,
          zone,
          exportedBy: printedBy,
          exportedAt: printedAt,
          fingerprint,
          history: content,
        },
        null,
        2,
      )
      return {
        content: new TextEncoder().encode(`${text}\n`),
        mediaType: 'application/json; charset=utf-8',
        fileName: `${name}.json`,
      }
    }
  }
}
