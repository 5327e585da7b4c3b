import { auditWords } from '../../../shared/messages/people.ts'
import { AuditTrail } from '../../features/audit/index.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

export function Component() {
  useSheetTitle(auditWords.title)
  return <AuditTrail />
}
