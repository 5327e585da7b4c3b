import { waterWords } from '../../../shared/messages/water-sheet.ts'
import { WaterList } from '../../features/water/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Enclosures and water: the list. */
export function Component() {
  useSheetTitle(waterWords.title)
  return <WaterList />
}
