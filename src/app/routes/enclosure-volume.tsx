import { useParams } from 'react-router-dom'
import { volumeWords } from '../../../shared/messages/volume-form.ts'
import { VolumeForm, WithEnclosureWater } from '../../features/water/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Measuring the volume of an enclosure's water. */
export function Component() {
  const { code = '' } = useParams()
  useSheetTitle(`${volumeWords.title}, ${code}`)
  return (
    <WithEnclosureWater code={code}>
      {(water) => <VolumeForm water={water} mayOnlyPropose={!water.may.includes('water.configure')} />}
    </WithEnclosureWater>
  )
}
