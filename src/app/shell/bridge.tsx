import { Search } from 'lucide-react'
import { Link } from 'react-router-dom'
import { frameWords } from '../../../shared/messages/frame.ts'
import type { FacilityNow } from '../../lib/facility-time.ts'
import { paths } from '../../lib/paths.ts'
import { Icon } from '../../ui/icon.tsx'
import { isMac } from '../../ui/key-list-dialog.tsx'
import { Mark } from '../../ui/mark.tsx'
import { useMedia } from '../../ui/use-media.ts'
import { FacilityClock } from './facility-clock.tsx'
import { PersonMenu } from './person-menu.tsx'
import { SheetLinks, SheetMenu } from './sheet-links.tsx'
import { UnsentMark } from './unsent-mark.tsx'

/** The bar over every sheet: mark, the eight sheets, find, facility time, the person. */
export function Bridge({
  now,
  onFind,
  onKeyList,
}: {
  now: FacilityNow
  onFind: () => void
  onKeyList: () => void
}) {
  const phone = useMedia('(max-width: 600px)')
  const tablet = useMedia('(max-width: 900px)')
  return (
    <header className="bridge">
      {phone ? (
        <SheetMenu behindMark />
      ) : (
        <Link className="brand" to={paths.today()} aria-label={frameWords.home}>
          <Mark />
          <b>{frameWords.name}</b>
        </Link>
      )}
      {phone ? <span /> : tablet ? <SheetMenu behindMark={false} /> : <SheetLinks />}
      <div className="bridge-end">
        <button
          type="button"
          className="ghost"
          aria-label={phone ? frameWords.find : undefined}
          onClick={onFind}
        >
          <Icon of={Search} size={phone ? 20 : 16} />
          {phone ? null : (
            <>
              {frameWords.find}
              <kbd className="t-note find-keys">{isMac() ? frameWords.findKeysMac : frameWords.findKeys}</kbd>
            </>
          )}
        </button>
        <UnsentMark short={tablet} />
        <FacilityClock now={now} />
        <PersonMenu onKeyList={onKeyList} short={tablet} />
      </div>
    </header>
  )
}
