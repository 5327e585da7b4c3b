import { useEffect, useId, useRef, useState } from 'react'
import type { ReactNode, RefObject } from 'react'
import { PanelRightOpen, X } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Drawer } from './drawer.tsx'
import { Icon } from './icon.tsx'
import { isSingleKey } from './single-keys.ts'
import { useSingleKeysOn } from './single-keys-context.ts'
import { useMedia } from './use-media.ts'

export interface LogEntry {
  key: string
  /** Heading of a day; set on the first entry of that day. */
  day?: string
  /** As shown, "13:52", and for machines. */
  time: string
  instant: string
  what: ReactNode
  /** Who wrote it: name and role. */
  who: string
  /** What can be done with it, at the end of that line. */
  act?: ReactNode
}

export interface LogColumnProps {
  title: string
  /** What the log is about, at the right of the heading. */
  about?: string
  entries: readonly LogEntry[]
  /** How many there are in all, where not all are shown. */
  count?: number
  /** Below the last entry: how to see older ones. */
  more?: ReactNode
  foot?: ReactNode
  /** A block above the entries, such as a handover note. */
  head?: ReactNode
}

/**
 * The log: what happened, newest first, with an entry box at its foot. A column beside the work; at 1200 px and below a
 * strip that opens it as a drawer. `L` goes to it, `N` in it starts an entry.
 */
export function LogColumn({ title, about, entries, count, more, foot, head }: LogColumnProps) {
  const narrow = useMedia('(max-width: 1200px)')
  const [open, setOpen] = useState(false)
  const column = useRef<HTMLElement>(null)
  const keysOn = useSingleKeysOn()

  useEffect(() => {
    if (!keysOn) return
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key.toLowerCase() !== 'l' || !isSingleKey(event)) return
      event.preventDefault()
      if (narrow) setOpen(true)
      else column.current?.focus()
    }
    document.addEventListener('keydown', onKeyDown)
    return () => document.removeEventListener('keydown', onKeyDown)
  }, [narrow, keysOn])

  const body = (
    <LogBody
      {...{ title, about, entries, more, foot, head, column }}
      onClose={narrow ? () => setOpen(false) : undefined}
    />
  )
  if (!narrow) return body
  return (
    <>
      <button type="button" className="log-strip" onClick={() => setOpen(true)}>
        <Icon of={PanelRightOpen} />
        {partWords.openLog({ title, count: count ?? entries.length })}
      </button>
      {open ? (
        <Drawer label={title} onBack={() => setOpen(false)}>
          {body}
        </Drawer>
      ) : null}
    </>
  )
}

function LogBody({
  title,
  about,
  entries,
  more,
  foot,
  head,
  column,
  onClose,
}: LogColumnProps & {
  column: RefObject<HTMLElement | null>
  onClose: (() => void) | undefined
}) {
  const id = useId()
  const keysOn = useSingleKeysOn()
  return (
    <aside
      ref={column}
      className="log"
      aria-labelledby={id}
      tabIndex={-1}
      onKeyDown={(event) => {
        const target = event.target as HTMLElement
        if (!keysOn || event.key.toLowerCase() !== 'n' || event.ctrlKey || event.metaKey || event.altKey)
          return
        if (target.matches('input, textarea, select')) return
        event.preventDefault()
        event.currentTarget.querySelector<HTMLElement>('.log-foot :is(input, textarea, button, a)')?.focus()
      }}
    >
      <div className="log-head">
        <h2 id={id} className="t-head">
          {title}
        </h2>
        {about ? <span className="t-note">{about}</span> : null}
        {onClose ? (
          <button type="button" className="ghost" aria-label={partWords.close} onClick={onClose}>
            <Icon of={X} size={20} />
          </button>
        ) : null}
      </div>
      <div className="log-entries" tabIndex={0} role="region" aria-labelledby={id}>
        {head}
        <ol>
          {entries.map((entry) => (
            <li key={entry.key}>
              {entry.day ? <p className="log-day">{entry.day}</p> : null}
              <div className="log-entry">
                <time dateTime={entry.instant}>{entry.time}</time>
                <div>
                  {entry.what}
                  <span className="log-who">
                    {entry.who} {entry.act}
                  </span>
                </div>
              </div>
            </li>
          ))}
        </ol>
        {more ? <div className="log-more">{more}</div> : null}
      </div>
      {foot ? <div className="log-foot">{foot}</div> : null}
    </aside>
  )
}
