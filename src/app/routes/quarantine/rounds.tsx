import { observationWords } from '../../../../shared/messages/observation-screens.ts'
import { Rounds } from '../../../features/observations/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** The round of the day. */
export function Component() {
  useSheetTitle(observationWords.round)
  return <Rounds />
}
