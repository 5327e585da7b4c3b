import { useState } from 'react'
import { partsPageWords as words } from '../../shared/messages/parts-page.ts'
import { HourRuler } from '../ui/hour-ruler.tsx'
import { PassageBoard } from '../ui/passage/passage-board.tsx'
import { PassageCase } from '../ui/passage/passage-case.tsx'
import { PassageKey } from '../ui/passage/passage-key.tsx'
import { PassageTable } from '../ui/passage/passage-table.tsx'
import { SegmentedChoice } from '../ui/segmented-choice.tsx'
import { PartGroup } from './part-group.tsx'
import { sampleDay, sampleNow } from './sample-day.ts'
import { sampleCase, sampleFrom, samplePassages, sampleToday, sampleUntil } from './sample-passages.ts'

/** The drawings need the whole width. */
export function DrawingParts() {
  const [density, setDensity] = useState<'roomy' | 'close' | null>('roomy')
  return (
    <>
      <PartGroup heading={words.ruler}>
        <HourRuler items={sampleDay} now={sampleNow.time} nowMinute={sampleNow.minute} />
      </PartGroup>
      <PartGroup heading={words.passages}>
        <SegmentedChoice
          label={words.passages}
          segments={[
            { value: 'roomy', label: words.roomy },
            { value: 'close', label: words.close },
          ]}
          value={density}
          onChange={setDensity}
        />
        <PassageKey />
        <div className="border border-ink">
          <PassageBoard
            passages={samplePassages}
            from={sampleFrom}
            until={sampleUntil}
            today={sampleToday}
            density={density ?? 'roomy'}
          />
        </div>
        <div className="border border-ink">
          <PassageCase view={sampleCase} from="2026-04-06" until="2026-06-02" />
        </div>
        <PassageTable view={sampleCase} />
      </PartGroup>
    </>
  )
}
