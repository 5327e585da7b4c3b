import { observationWords } from '../../../../shared/messages/observation-screens.ts'
import { Unsent } from '../../../features/observations/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** Entries on this device that the server does not have. */
export function Component() {
  useSheetTitle(observationWords.unsentTitle)
  return <Unsent />
}
