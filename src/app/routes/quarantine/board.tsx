import { quarantineWords } from '../../../../shared/messages/quarantine-screens.ts'
import { QuarantineBoard } from '../../../features/quarantine/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** Quarantine: every case on one day ruler. */
export function Component() {
  useSheetTitle(quarantineWords.title)
  return <QuarantineBoard />
}
