import { peopleWords } from '../../../shared/messages/people.ts'
import { NewPerson } from '../../features/people/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

export function Component() {
  useSheetTitle(peopleWords.enter)
  return <NewPerson />
}
