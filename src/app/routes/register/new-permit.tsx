import { Link, useNavigate } from 'react-router-dom'
import { permitWords as words } from '../../../../shared/messages/permits-sheet.ts'
import { PermitForm } from '../../../features/permits/index.ts'
import { paths } from '../../../lib/paths.ts'
import { Cartouche } from '../../../ui/cartouche.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** The form of a permit. */
export function Component() {
  useSheetTitle(words.newPermit)
  const navigate = useNavigate()
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche
          place={<Link to={paths.permits()}>{words.title}</Link>}
          title={words.newPermit}
          source={words.formSource}
        />
      </Area>
      <Area className="pane">
        <PermitForm onEntered={(permit) => void navigate(paths.permit(permit.number))} />
      </Area>
    </Sheet>
  )
}
