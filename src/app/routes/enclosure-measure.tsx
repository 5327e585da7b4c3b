import { useParams } from 'react-router-dom'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { ReadingForm, WithEnclosureWater } from '../../features/water/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Readings entered at the tank. */
export function Component() {
  const { code = '' } = useParams()
  useSheetTitle(`${readingWords.formTitle}, ${code}`)
  return <WithEnclosureWater code={code}>{(water) => <ReadingForm water={water} />}</WithEnclosureWater>
}
