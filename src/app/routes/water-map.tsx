import { mapWords } from '../../../shared/messages/water-map.ts'
import { WaterMapSheet } from '../../features/water/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Bodies of water with their valves and pumps. */
export function Component() {
  useSheetTitle(mapWords.title)
  return <WaterMapSheet />
}
