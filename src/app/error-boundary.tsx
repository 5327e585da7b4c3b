import { useEffect, useState } from 'react'
import { isRouteErrorResponse, Link, useRouteError } from 'react-router-dom'
import { frameWords } from '../../shared/messages/frame.ts'
import { paths } from '../lib/paths.ts'
import { isProblem } from '../lib/problem-error.ts'
import { isNotLoaded, whyNotLoaded } from '../lib/why-not-loaded.ts'
import type { NotLoaded } from '../lib/why-not-loaded.ts'
import { Button } from '../ui/button.tsx'
import { PlainSheet } from './shell/plain-sheet.tsx'

function lineOf(error: unknown): string {
  if (isRouteErrorResponse(error)) return `${error.status} ${error.statusText}`
  if (isProblem(error)) return [error.code, error.requestId].filter(Boolean).join(' ')
  return error instanceof Error ? `${error.name}: ${error.message}` : String(error)
}

/** What stands in place of a screen that stopped working; it never takes the whole client with it without words. */
export function RouteError() {
  const error = useRouteError()
  const missing = isNotLoaded(error)
  const why = useWhyNotLoaded(missing)
  const unreachable = isProblem(error) && (error.noAnswer || error.status === 503)
  useEffect(() => {
    document.title = frameWords.titled({ sheet: frameWords.broke })
  }, [])
  // a moment, until the server has said or has not said which version it has
  if (missing && why === null) return null
  const [title, body] = missing
    ? notLoadedWords[why ?? 'unknown']
    : unreachable
      ? [frameWords.unreachable, frameWords.unreachableBody]
      : [frameWords.broke, frameWords.brokeBody]
  return (
    <PlainSheet
      title={title}
      alert
      acts={
        <>
          <Button kind="primary" onClick={() => window.location.reload()}>
            {frameWords.loadAgain}
          </Button>
          {why === 'no-signal' ? (
            <Link className="btn" to={paths.rounds()}>
              {frameWords.toRounds}
            </Link>
          ) : null}
        </>
      }
    >
      <p>{body}</p>
      {missing ? null : <p className="t-note">{lineOf(error)}</p>}
    </PlainSheet>
  )
}

const notLoadedWords: Record<NotLoaded, readonly [string, string]> = {
  'no-signal': [frameWords.sheetNotHere, frameWords.sheetNotHereBody],
  'new-version': [frameWords.newVersion, frameWords.newVersionBody],
  unknown: [frameWords.notLoaded, frameWords.notLoadedBody],
}

/** Asked while a script is missing; null until it is known. */
function useWhyNotLoaded(missing: boolean): NotLoaded | null {
  const [why, setWhy] = useState<NotLoaded | null>(null)
  useEffect(() => {
    if (missing) void whyNotLoaded().then(setWhy)
  }, [missing])
  return why
}
