import { useParams } from 'react-router-dom'
import { EnclosureSheet, WithEnclosureWater } from '../../features/water/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/**
 * One enclosure with its water. Who lives in it, and which cases and orders run in its water, are areas that their own
 * features put between `<EnclosureSheet>` and `</EnclosureSheet>`.
 */
export function Component() {
  const { code = '' } = useParams()
  useSheetTitle(code)
  return <WithEnclosureWater code={code}>{(water) => <EnclosureSheet water={water} />}</WithEnclosureWater>
}
