import { lazy, Suspense, useEffect, useRef, useState } from 'react'
import { Anchor } from 'lucide-react'
import { Navigate, Outlet, useLocation, useNavigate } from 'react-router-dom'
import { frameWords } from '../../../shared/messages/frame.ts'
import { useFacilityNow } from '../../lib/facility-time.ts'
import { useMe } from '../../lib/me.ts'
import { paths } from '../../lib/paths.ts'
import { useSingleKeys } from '../../lib/preferences.ts'
import { useOutboxSending } from '../../lib/use-outbox.ts'
import { useWithoutSignal } from '../../lib/use-without-signal.ts'
import { Banner } from '../../ui/banner.tsx'
import { FindDialog } from '../../ui/find-dialog.tsx'
import { HourRuler } from '../../ui/hour-ruler.tsx'
import { KeyListDialog } from '../../ui/key-list-dialog.tsx'
import { QuantityToolsContext } from '../../ui/quantity-context.ts'
import { HoursAboveContext } from '../../ui/sheet.tsx'
import { SingleKeysContext } from '../../ui/single-keys-context.ts'
import { SkipLink } from '../../ui/skip-link.tsx'
import { useSheetKeys } from '../../ui/use-sheet-keys.ts'
import { sheets } from '../sheets.ts'
import { WithMe } from '../with-me.tsx'
import { Bridge } from './bridge.tsx'
import { useDueToday } from './due-today.ts'
import { useQuantityTools } from './use-quantity-tools.ts'

/** What finds are drawn with comes when somebody looks for something. */
const FindResults = lazy(async () => ({
  default: (await import('../../features/find/index.ts')).FindResults,
}))

/** The frame around every sheet. */
export function Component() {
  return (
    <WithMe>
      <SignedInFrame />
    </WithMe>
  )
}

function SignedInFrame() {
  const me = useMe()
  useOutboxSending()
  useWithoutSignal()
  const [front, setFront] = useState<'find' | 'keys' | null>(null)
  const navigate = useNavigate()
  const now = useFacilityNow(me.facility.zone)
  const due = useDueToday()
  const singleKeys = useSingleKeys()
  const quantityTools = useQuantityTools(me.facility.gallon)
  const { pathname } = useLocation()
  const arrived = useRef(pathname)

  useSheetKeys({
    singleKeys,
    onSheet: (number) => {
      const sheet = sheets()[number - 1]
      if (sheet) void navigate(sheet.to)
    },
    onFind: () => setFront('find'),
    onKeyList: () => setFront('keys'),
  })

  useEffect(() => {
    // a new sheet is read from its beginning; the first one after loading is, without help
    if (arrived.current === pathname) return
    arrived.current = pathname
    document.getElementById('chart')?.focus({ preventScroll: true })
    window.scrollTo(0, 0)
  }, [pathname])

  if (me.mustChangePassword) return <Navigate to={paths.newPassword()} replace />
  return (
    <SingleKeysContext value={singleKeys}>
      <HoursAboveContext value={due !== null}>
        <div className="page">
          <SkipLink />
          <Bridge now={now} onFind={() => setFront('find')} onKeyList={() => setFront('keys')} />
          <div>
            {me.facility.demo ? <Banner icon={Anchor}>{frameWords.demo}</Banner> : null}
            {due === null ? null : <HourRuler items={due} now={now.time} nowMinute={now.minute} />}
          </div>
          <QuantityToolsContext value={quantityTools}>
            <Outlet />
          </QuantityToolsContext>
        </div>
        {front === 'find' ? (
          <FindDialog onBack={() => setFront(null)}>
            {(typed) => (
              <Suspense>
                <FindResults text={typed} onGo={() => setFront(null)} />
              </Suspense>
            )}
          </FindDialog>
        ) : null}
        {front === 'keys' ? <KeyListDialog onBack={() => setFront(null)} /> : null}
      </HoursAboveContext>
    </SingleKeysContext>
  )
}
