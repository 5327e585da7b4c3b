import { useEffect, useRef, useState } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Link } from 'react-router-dom'
import type { FoundKind } from '../../../shared/contracts/find.contract.ts'
import { findWords, foundKindNames } from '../../../shared/messages/today.ts'
import { paths } from '../../lib/paths.ts'
import { findQuery } from './queries.ts'

const pauseMs = 180

const addresses: Record<FoundKind, (key: string) => string> = {
  animal: paths.animal,
  enclosure: paths.enclosure,
  order: paths.order,
  case: paths.quarantineCase,
  transaction: paths.transaction,
  permit: paths.permit,
  person: paths.person,
}

/** The text once somebody has paused, so that not every letter is asked for. */
function usePaused(text: string): string {
  const [paused, setPaused] = useState(text)
  useEffect(() => {
    const timer = setTimeout(() => setPaused(text), pauseMs)
    return () => clearTimeout(timer)
  }, [text])
  return paused
}

/**
 * What was found, by kind, as links. Arrows go from the field to the finds and among them, Enter opens one.
 *
 * @param onGo called when a find is opened
 */
export function FindResults({ text, onGo }: { text: string; onGo: () => void }) {
  const asked = usePaused(text)
  const { data, isError, isFetching } = useQuery(findQuery(asked))
  const list = useRef<HTMLDivElement>(null)

  useEffect(() => {
    const dialog = list.current?.closest('dialog')
    if (!dialog) return
    const onKeyDown = (event: KeyboardEvent) => {
      if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return
      const stops = [...dialog.querySelectorAll<HTMLElement>('input[type=search], .find-results a')]
      const at = stops.findIndex((stop) => stop === document.activeElement)
      const next = stops[at + (event.key === 'ArrowDown' ? 1 : -1)]
      if (!next) return
      event.preventDefault()
      next.focus()
    }
    dialog.addEventListener('keydown', onKeyDown)
    return () => dialog.removeEventListener('keydown', onKeyDown)
  }, [])

  useEffect(() => {
    // what was found for the text as it was goes when that for the whole text comes: the keys go back to the field with it
    const dialog = list.current?.closest('dialog')
    if (dialog && !dialog.contains(document.activeElement))
      dialog.querySelector<HTMLElement>('input[type=search]')?.focus()
  }, [data])

  const groups = data?.groups ?? []
  const settled = data !== undefined && asked === text && !isFetching
  const count = groups.reduce((sum, group) => sum + group.total, 0)
  return (
    <div ref={list} className="found">
      <p className="visually-hidden" role="status">
        {settled ? (count === 0 ? findWords.nothing({ text: asked }) : findWords.count({ count })) : ''}
      </p>
      {isError ? (
        <p role="alert">{findWords.failed}</p>
      ) : settled && groups.length === 0 ? (
        <>
          <p className="t-strong">{findWords.nothing({ text: asked })}</p>
          <p className="t-note">{findWords.tryOther}</p>
        </>
      ) : null}
      {!isError && data === undefined ? <p className="t-note">{findWords.finding}</p> : null}
      {groups.map((group) => (
        <section key={group.kind} aria-label={foundKindNames[group.kind]}>
          <h3 className="t-label">{foundKindNames[group.kind]}</h3>
          <ul>
            {group.rows.map((row) => (
              <li key={row.key}>
                <Link to={addresses[group.kind](row.key)} onClick={onGo}>
                  <b>{row.name}</b>
                  {row.note === '' ? null : <span className="t-note">{row.note}</span>}
                </Link>
              </li>
            ))}
          </ul>
          {group.total > group.rows.length ? (
            <p className="t-note">{findWords.more({ count: group.total - group.rows.length })}</p>
          ) : null}
        </section>
      ))}
    </div>
  )
}
