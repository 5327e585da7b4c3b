import { useParams } from 'react-router-dom'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { ReadingList } from '../../features/water/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Every reading of an enclosure's water. */
export function Component() {
  const { code = '' } = useParams()
  useSheetTitle(`${readingWords.listTitle}, ${code}`)
  return <ReadingList code={code} />
}
