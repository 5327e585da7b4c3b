import { caseForms } from '../../../../shared/messages/quarantine-forms.ts'
import { OpenCaseForm } from '../../../features/quarantine/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** Opening a quarantine case. */
export function Component() {
  useSheetTitle(caseForms.openTitle)
  return <OpenCaseForm />
}
