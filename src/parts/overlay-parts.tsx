import { useState } from 'react'
import { WifiOff } from 'lucide-react'
import { partsPageWords as words } from '../../shared/messages/parts-page.ts'
import { Banner } from '../ui/banner.tsx'
import { Button } from '../ui/button.tsx'
import { Dialog } from '../ui/dialog.tsx'
import { Drawer } from '../ui/drawer.tsx'
import { LogColumn } from '../ui/log-column.tsx'
import { TextField } from '../ui/text-field.tsx'
import { Toast } from '../ui/toast.tsx'
import { useToast } from '../ui/toast-context.ts'
import { PartGroup } from './part-group.tsx'

const entries = [
  {
    key: '1',
    day: words.logDay,
    time: '13:52',
    instant: '2026-05-14T13:52:00-04:00',
    what: words.logEntry,
    who: words.logWho,
  },
  { key: '2', time: '08:10', instant: '2026-05-14T08:10:00-04:00', what: words.logEntry, who: words.logWho },
]

export function OverlayParts() {
  const [open, setOpen] = useState<'dialog' | 'drawer' | null>(null)
  const [why, setWhy] = useState('')
  const [shown, setShown] = useState(true)
  const toast = useToast()
  const log = (
    <LogColumn
      title={words.log}
      about={words.logAbout}
      entries={entries}
      foot={<Button>{words.writeInLog}</Button>}
    />
  )
  return (
    <PartGroup heading={words.overlays}>
      <Banner icon={WifiOff}>{words.noSignal}</Banner>
      <div className="row row-wrap">
        <Button onClick={() => setOpen('dialog')}>{words.openDialog}</Button>
        <Button onClick={() => setOpen('drawer')}>{words.openDrawer}</Button>
        <Button onClick={() => toast({ words: words.saved })}>{words.sayToast}</Button>
      </div>
      {shown ? <Toast toast={{ words: words.saved }} onGone={() => setShown(false)} /> : null}
      <div className="h-64 grid border border-ink">{log}</div>
      {open === 'dialog' ? (
        <Dialog
          question={words.dialogTitle}
          typed={why !== ''}
          onBack={() => {
            setOpen(null)
            setWhy('')
          }}
          acts={
            <>
              <Button kind="primary">{words.stopOrder}</Button>
              <Button
                onClick={() => {
                  setOpen(null)
                  setWhy('')
                }}
              >
                {words.keepRunning}
              </Button>
            </>
          }
        >
          <p>{words.dialogBody}</p>
          <TextField label={words.reason} value={why} onChange={(event) => setWhy(event.target.value)} />
        </Dialog>
      ) : null}
      {open === 'drawer' ? (
        <Drawer label={words.log} onBack={() => setOpen(null)}>
          <div className="pane stack">
            <p className="t-head">{words.log}</p>
            <Button onClick={() => setOpen(null)}>{words.keepRunning}</Button>
          </div>
        </Drawer>
      ) : null}
    </PartGroup>
  )
}
