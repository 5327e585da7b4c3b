import { peopleWords } from '../../../shared/messages/people.ts'
import { PeopleList } from '../../features/people/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

export function Component() {
  useSheetTitle(peopleWords.title)
  return <PeopleList />
}
