import { useParams } from 'react-router-dom'
import { volumeWords } from '../../../shared/messages/volume-form.ts'
import { VolumeList, WithEnclosureWater } from '../../features/water/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Every determination of an enclosure's volume, with who confirmed it. */
export function Component() {
  const { code = '' } = useParams()
  useSheetTitle(`${volumeWords.versionsTitle}, ${code}`)
  return <WithEnclosureWater code={code}>{(water) => <VolumeList water={water} />}</WithEnclosureWater>
}
