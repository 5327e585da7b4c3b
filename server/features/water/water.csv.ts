import type { WaterListRow } from '../../../shared/contracts/water.contract.ts'
import type { ReadingRow } from '../../../shared/contracts/water-facts.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import {
  parameterNames,
  phScaleNames,
  readingLevels,
  volumeStates,
  waterColumns,
} from '../../../shared/messages/water.ts'
import { csvReply } from '../../platform/http/csv-reply.ts'
import type { FileReply } from '../../platform/http/route.ts'

const symbol = (code: string) => (isUnitCode(code) ? unitOf(code).symbol : code)
const figure = (row: { below: boolean; value: { value: string } }) =>
  `${row.below ? '<' : ''}${row.value.value}`

/** The water list as a spreadsheet reads it: what the screen shows, one column a fact. */
export function waterCsv(rows: readonly WaterListRow[]): FileReply {
  return csvReply(
    'water.csv',
    [
      { header: waterColumns.code, value: (row) => row.code },
      { header: waterColumns.name, value: (row) => row.name },
      { header: waterColumns.area, value: (row) => row.area },
      { header: waterColumns.connected, value: (row) => row.connectedCodes.join(' ') },
      { header: waterColumns.netVolume, value: (row) => row.netVolumeLitres },
      { header: waterColumns.error, value: (row) => row.errorPercent },
      { header: waterColumns.volumeState, value: (row) => volumeStates[row.volumeState] },
      { header: waterColumns.lastReading, value: (row) => row.lastReadingAt },
      {
        header: waterColumns.outside,
        value: (row) =>
          row.outside
            .map((one) => `${parameterNames[one.parameter]} ${figure(one)} ${symbol(one.value.unit)}`)
            .join('; '),
      },
      { header: waterColumns.off, value: (row) => row.lifeSupportOff.join(' ') },
    ],
    rows,
  )
}

/** Readings as a spreadsheet reads them: the figure as entered, and the canonical one beside it. */
export function readingsCsv(code: string, rows: readonly ReadingRow[]): FileReply {
  return csvReply(
    `readings-${code}.csv`,
    [
      { header: waterColumns.happenedAt, value: (row) => row.happenedAt },
      { header: waterColumns.happenedOn, value: (row) => row.happenedOn },
      { header: waterColumns.water, value: (row) => row.waterBodyCode },
      { header: waterColumns.parameter, value: (row) => parameterNames[row.parameter] },
      { header: waterColumns.value, value: (row) => figure(row) },
      { header: waterColumns.unit, value: (row) => symbol(row.value.unit) },
      { header: waterColumns.scale, value: (row) => (row.scale ? phScaleNames[row.scale] : '') },
      { header: waterColumns.canonical, value: (row) => row.canonicalValue },
      { header: waterColumns.canonicalUnit, value: (row) => symbol(row.canonicalUnit) },
      { header: waterColumns.judgement, value: (row) => readingLevels[row.judgement.level] },
      { header: waterColumns.instrument, value: (row) => row.instrument },
      { header: waterColumns.note, value: (row) => row.note },
      { header: waterColumns.recordedBy, value: (row) => row.recordedBy },
      { header: waterColumns.recordedAt, value: (row) => row.recordedAt },
      { header: waterColumns.voided, value: (row) => row.voided?.reason ?? '' },
    ],
    rows,
  )
}
