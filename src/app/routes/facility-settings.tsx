import { facilityWords } from '../../../shared/messages/people.ts'
import { FacilitySettings } from '../../features/facility/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

export function Component() {
  useSheetTitle(facilityWords.title)
  return <FacilitySettings />
}
