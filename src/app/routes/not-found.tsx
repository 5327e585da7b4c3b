import { frameWords } from '../../../shared/messages/frame.ts'
import { paths } from '../../lib/paths.ts'
import { ButtonLink } from '../../ui/button-link.tsx'
import { PlainSheet } from '../shell/plain-sheet.tsx'
import { useSheetTitle } from '../shell/use-sheet-title.ts'

/** Nothing at this address. */
export function Component() {
  useSheetTitle(frameWords.nothingHere)
  return (
    <PlainSheet
      title={frameWords.nothingHere}
      acts={
        <ButtonLink kind="primary" to={paths.today()}>
          {frameWords.toToday}
        </ButtonLink>
      }
    >
      <p>{frameWords.nothingHereBody}</p>
    </PlainSheet>
  )
}
