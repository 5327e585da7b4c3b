import { useParams } from 'react-router-dom'
import { AnimalSheet } from '../../features/animals/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** The chart of one animal or group. What other features know of it is put beside it here. */
export function Component() {
  const { accession = '' } = useParams()
  useSheetTitle(accession)
  return <AnimalSheet key={accession} accession={accession} />
}
