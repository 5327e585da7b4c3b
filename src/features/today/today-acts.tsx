import { useRef, useState } from 'react'
import { Link } from 'react-router-dom'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { formWords } from '../../../shared/messages/form.ts'
import { goWords, todayWords } from '../../../shared/messages/today.ts'
import { newId } from '../../lib/new-id.ts'
import { paths } from '../../lib/paths.ts'
import { useUnsent } from '../../lib/stop-entries.ts'
import { isProblem } from '../../lib/problem-error.ts'
import { Button } from '../../ui/button.tsx'
import { ButtonLink } from '../../ui/button-link.tsx'
import { ReasonDialog } from '../../ui/reason-dialog.tsx'
import { useToast } from '../../ui/toast-context.ts'
import { addressOfWork } from './address-of.ts'
import { useLiftOrder, useMarkRead } from './mutations.ts'
import { StopBathDialog } from './stop-bath-dialog.tsx'

/** What can be done with a piece of work where it stands, and the way to where it is done. */
export function TodayActs({ item, title }: { item: TodayWork; title: string }) {
  if (item.state === 'coming' || item.state === 'done') return null
  // a held dose is not to be prepared
  const go = item.kind === 'dose' && item.state === 'waiting' ? '' : goWords[item.kind]
  if (go === '' && item.acts.length === 0) return null
  return (
    <div className="today-acts">
      {item.acts.includes('stop-bath') ? <StopBath item={item} /> : null}
      {item.acts.includes('mark-read') ? <MarkRead item={item} /> : null}
      {item.acts.includes('lift-order') ? <LiftOrder item={item} /> : null}
      {go === '' ? null : (
        <ButtonLink
          to={addressOfWork(item)}
          size="small"
          kind={item.kind === 'case-ready' ? 'clear' : 'edge'}
          aria-label={`${go}: ${title}`}
        >
          {go}
        </ButtonLink>
      )}
    </div>
  )
}

function StopBath({ item }: { item: TodayWork }) {
  const [open, setOpen] = useState(false)
  const unsent = useUnsent({ doseId: String(item.params['doseId']) })
  if (unsent !== null)
    return (
      <p role="status" className="t-strong">
        {todayWords.stopKept} <Link to={paths.unsent()}>{todayWords.toUnsent}</Link>
      </p>
    )
  return (
    <>
      <Button kind="stop" size="small" onClick={() => setOpen(true)}>
        {todayWords.stop}
      </Button>
      {open ? <StopBathDialog item={item} onBack={() => setOpen(false)} /> : null}
    </>
  )
}

function MarkRead({ item }: { item: TodayWork }) {
  const mark = useMarkRead()
  const toast = useToast()
  const id = useRef(newId())
  return (
    <>
      <Button
        size="small"
        shut={mark.isPending && formWords.sending}
        onClick={() =>
          mark.mutate(
            { observationId: String(item.params['observationId']), id: id.current },
            { onSuccess: () => toast({ words: todayWords.readNow }) },
          )
        }
      >
        {todayWords.markRead}
      </Button>
      {isProblem(mark.error) ? <p role="alert">{mark.error.says}</p> : null}
    </>
  )
}

function LiftOrder({ item }: { item: TodayWork }) {
  const [open, setOpen] = useState(false)
  const lift = useLiftOrder()
  const toast = useToast()
  const key = useRef(newId())
  const number = String(item.params['number'])
  return (
    <>
      <Button size="small" onClick={() => setOpen(true)}>
        {todayWords.lift}
      </Button>
      {open ? (
        <ReasonDialog
          question={todayWords.liftQuestion({ number })}
          body={todayWords.liftBody}
          label={todayWords.liftLabel}
          act={todayWords.lift}
          back={todayWords.back}
          onBack={() => setOpen(false)}
          onAct={async (reason) => {
            await lift.mutateAsync({ number, reason, key: key.current })
            setOpen(false)
            toast({ words: todayWords.lifted({ number }) })
          }}
        />
      ) : null}
    </>
  )
}
