import { ruleSheetWords } from '../../../shared/messages/caution-rules-sheet.ts'
import { RulesSheet } from '../../features/cautions/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

export function Component() {
  useSheetTitle(ruleSheetWords.title)
  return <RulesSheet />
}
