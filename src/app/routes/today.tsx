import { todayWords } from '../../../shared/messages/today.ts'
import { TodaySheet } from '../../features/today/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Today: the worklist of the signed-in person. */
export function Component() {
  useSheetTitle(todayWords.title)
  return <TodaySheet />
}
