import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import type { Clock } from '../../platform/clock.ts'
import { drawable } from '../../platform/pdf/drawable.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { FacilityService } from '../facility/index.ts'
import { answerOf } from './answer.ts'
import { benchDocument } from './bench-document.ts'

export interface SheetParts {
  clock: Clock
  pdf: PdfPool
  facility: FacilityService
}

/** Asks a calculator anew and prints what it answers. The paper is no record: nothing of it is kept. */
export function createSheetPrinter({ clock, pdf, facility }: SheetParts) {
  return async (of: AnyCalculator, body: unknown, printedBy: string): Promise<Uint8Array> => {
    const answer = await answerOf(of, body)
    const model = benchDocument({
      of,
      body,
      answer,
      facility: await facility.valueOf('facility.name'),
      zone: await facility.zone(),
      paper: await facility.paper(),
      printedBy,
      printedAt: clock.now().toISOString(),
    })
    return pdf.renderPdf(drawable(model))
  }
}

export type PrintBenchSheet = ReturnType<typeof createSheetPrinter>
