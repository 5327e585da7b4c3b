import { useEffect } from 'react'
import { isRouteErrorResponse, useRouteError } from 'react-router-dom'
import { frameWords } from '../../shared/messages/frame.ts'
import { isProblem } from '../lib/problem-error.ts'
import { Button } from '../ui/button.tsx'
import { PlainSheet } from './shell/plain-sheet.tsx'

/** A script of an earlier version that is no longer on the server: the page has to be loaded anew. */
function isOldVersion(error: unknown): boolean {
  return (
    error instanceof Error &&
    /dynamically imported module|Importing a module script failed/i.test(error.message)
  )
}

function lineOf(error: unknown): string {
  if (isRouteErrorResponse(error)) return `${error.status} ${error.statusText}`
  if (isProblem(error)) return [error.code, error.requestId].filter(Boolean).join(' ')
  return error instanceof Error ? `${error.name}: ${error.message}` : String(error)
}

/** What stands in place of a screen that stopped working; it never takes the whole client with it without words. */
export function RouteError() {
  const error = useRouteError()
  const old = isOldVersion(error)
  const unreachable = isProblem(error) && (error.noAnswer || error.status === 503)
  useEffect(() => {
    document.title = frameWords.titled({ sheet: frameWords.broke })
  }, [])
  const [title, body] = old
    ? [frameWords.newVersion, frameWords.newVersionBody]
    : unreachable
      ? [frameWords.unreachable, frameWords.unreachableBody]
      : [frameWords.broke, frameWords.brokeBody]
  return (
    <PlainSheet
      title={title}
      alert
      acts={
        <Button kind="primary" onClick={() => window.location.reload()}>
          {frameWords.loadAgain}
        </Button>
      }
    >
      <p>{body}</p>
      {old ? null : <p className="t-note">{lineOf(error)}</p>}
    </PlainSheet>
  )
}
