import { useParams } from 'react-router-dom'
import { frameWords } from '../../../shared/messages/frame.ts'
import { sheetNames } from '../sheet-names.ts'
import { useSheetTitle } from '../shell/use-sheet-title.ts'
import { PlainSheet } from '../shell/plain-sheet.tsx'
import { Component as NotFound } from './not-found.tsx'

/** Where the bridge leads for a sheet that has not been built: it says so, and pretends nothing. */
export function Component() {
  const { sheet } = useParams()
  const name = sheetNames.find((known) => known === sheet)
  useSheetTitle(name ? frameWords[name] : frameWords.nothingHere)
  if (!name) return <NotFound />
  return (
    <PlainSheet place={frameWords.notHereYet} title={frameWords.notHereYetTitle({ sheet: frameWords[name] })}>
      <p>{frameWords.notHereYetBody}</p>
    </PlainSheet>
  )
}
