import { formatExpression } from '../../../shared/domain/quantities/format-expression.ts'
import { formatVolumeWithError } from '../../../shared/domain/quantities/format-volume-with-error.ts'
import { formatWorkingValue } from '../../../shared/domain/quantities/format-working-value.ts'
import type { WorkingLine } from '../../../shared/domain/working/working-line.ts'
import { workingLabels } from '../../../shared/messages/working.ts'
import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { Quantity } from '../../ui/quantity.tsx'
import { WorkingBlock } from '../../ui/working-block.tsx'
import type { WorkingRow } from '../../ui/working-block.tsx'

/** Lines of working as they came over the wire; a line that this version has no words for is left out. */
export function workingLinesOf(lines: readonly { code: string }[]): WorkingLine[] {
  return lines.filter((line): line is WorkingLine => Object.hasOwn(workingLabels, line.code))
}

/** The working of a net volume, line by line, ending in the net volume and what is shown of it. */
export function VolumeWorking({ lines }: { lines: readonly WorkingLine[] }) {
  const net = lines.find((line) => line.key === 'net-volume')
  const percent = lines.find((line) => line.key === 'volume-error-percent')
  const error = lines.find((line) => line.key === 'volume-error')
  const share = percent ? percent.value : net && error ? (error.value / net.value) * 100 : 0
  const rows = lines
    .filter((line) => line !== net)
    .map((line): WorkingRow => ({
      key: line.key,
      what: workingLabels[line.code](line.params),
      formula: formatExpression(line.expression),
      result: <Quantity of={formatWorkingValue(line)} />,
    }))
  if (net) {
    const shown = formatVolumeWithError(net.value, share)
    rows.push({
      key: net.key,
      what: workingLabels[net.code](net.params),
      formula: `${formatExpression(net.expression)}; ${waterWords.shownAs({ volume: shown.text })}`,
      result: <Quantity of={formatWorkingValue(net)} />,
      kind: 'sum',
    })
  }
  return <WorkingBlock label={waterWords.working} rows={rows} />
}
