import { useQuery } from '@tanstack/react-query'
import { useParams } from 'react-router-dom'
import { caseWords } from '../../../../shared/messages/quarantine-case.ts'
import { caseQuery, CaseSheet } from '../../../features/quarantine/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'
import { OneRecord } from '../register/one-record.tsx'

/** One quarantine case. */
export function Component() {
  const { number = '' } = useParams()
  useSheetTitle(number)
  const query = useQuery(caseQuery(number))
  return (
    <OneRecord query={query} what={caseWords.what}>
      {(detail, above) => <CaseSheet key={number} of={detail} above={above} />}
    </OneRecord>
  )
}
