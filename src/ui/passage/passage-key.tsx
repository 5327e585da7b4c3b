import type { ReactNode } from 'react'
import { passageWords } from '../../../shared/messages/passage.ts'
import { AnchorMark } from '../empty-harbour.tsx'
import { StepPicture } from '../step-mark.tsx'
import { BreakMark } from './course-drawing.tsx'

/** What the marks mean, in words, over the board. */
export function PassageKey() {
  return (
    <ul className="passage-key" aria-label={passageWords.key}>
      <Entry picture={<StepPicture state="done" />} words={passageWords.stepDone} />
      <Entry picture={<StepPicture state="due" />} words={passageWords.due} />
      <Entry picture={<StepPicture state="to-come" />} words={passageWords.toCome} />
      <Entry picture={<StepPicture state="overdue" />} words={passageWords.overdue} />
      <Entry picture={<StepPicture state="failed" />} words={passageWords.failed} />
      <Entry
        picture={
          <Picture>
            <BreakMark x={11} y={10} />
          </Picture>
        }
        words={passageWords.restarted}
      />
      <Entry
        picture={
          <Picture>
            <AnchorMark x={11} y={10} />
          </Picture>
        }
        words={passageWords.earliestClearance}
      />
      <Entry
        picture={
          <Picture>
            <text x="11" y="14" className="sounding">
              23
            </text>
          </Picture>
        }
        words={passageWords.animalsCounted}
      />
    </ul>
  )
}

function Picture({ children }: { children: ReactNode }) {
  return (
    <svg width="22" height="20" viewBox="0 0 22 20" aria-hidden="true">
      {children}
    </svg>
  )
}

function Entry({ picture, words }: { picture: ReactNode; words: string }) {
  return (
    <li>
      {picture}
      {words}
    </li>
  )
}
