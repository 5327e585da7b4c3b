import { useParams } from 'react-router-dom'
import { observationWords } from '../../../../shared/messages/observation-screens.ts'
import { UrgentSheet } from '../../../features/observations/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** An urgent call and its fate. */
export function Component() {
  const { id = '' } = useParams()
  useSheetTitle(observationWords.callTitle)
  return <UrgentSheet key={id} id={id} />
}
