import { useParams } from 'react-router-dom'
import { peopleWords } from '../../../shared/messages/people.ts'
import { PersonSheet } from '../../features/people/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

export function Component() {
  useSheetTitle(peopleWords.people)
  const { id = '' } = useParams()
  return <PersonSheet key={id} id={id} />
}
