import { animalWords } from '../../../shared/messages/animal-sheet.ts'
import { AnimalList } from '../../features/animals/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Animals and groups: the list. */
export function Component() {
  useSheetTitle(animalWords.title)
  return <AnimalList />
}
