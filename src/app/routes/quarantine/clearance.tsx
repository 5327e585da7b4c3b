import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { caseWords } from '../../../../shared/messages/quarantine-case.ts'
import { caseForms } from '../../../../shared/messages/quarantine-forms.ts'
import { caseQuery, ClearanceForm } from '../../../features/quarantine/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from '../register/one-record.tsx'

/** Signing the clearance of a case. */
export function Component() {
  const { number = '' } = useParams()
  useSheetTitle(caseForms.clearTitle({ number }))
  const query = useQuery(caseQuery(number))
  return (
    <OneRecord query={query} what={caseWords.what}>
      {(detail) => <ClearanceForm key={number} of={detail} />}
    </OneRecord>
  )
}
