import { useEffect } from 'react'
import { useParams } from 'react-router-dom'
import { observationWords } from '../../../../shared/messages/observation-screens.ts'
import { ObservationSheet } from '../../../features/observations/index.ts'
import { useSheetTitle } from '../../shell/use-sheet-title.ts'

/** Every sheet that an entry leads to, fetched while there is a signal: it may be gone when the entry is made. */
function fetchWhatFollows(): void {
  const sheets = [
    import('./urgent.tsx'),
    import('./rounds.tsx'),
    import('./unsent.tsx'),
    import('../../shell/frame.tsx'),
  ]
  // one that can't be fetched now is asked for again when it is opened
  void Promise.allSettled(sheets)
}

/** What is seen at one enclosure, for the hand. */
export function Component() {
  const { code = '' } = useParams()
  useSheetTitle(observationWords.title({ code }))
  useEffect(fetchWhatFollows, [])
  return <ObservationSheet key={code} code={code} />
}
