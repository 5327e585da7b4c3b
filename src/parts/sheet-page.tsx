import { Plus } from 'lucide-react'
import { passageWords } from '../../shared/messages/passage.ts'
import { partsPageWords as words } from '../../shared/messages/parts-page.ts'
import { Button } from '../ui/button.tsx'
import { Cartouche } from '../ui/cartouche.tsx'
import { HourRuler } from '../ui/hour-ruler.tsx'
import { LogColumn } from '../ui/log-column.tsx'
import { PassageBoard } from '../ui/passage/passage-board.tsx'
import { PassageKey } from '../ui/passage/passage-key.tsx'
import { SegmentedChoice } from '../ui/segmented-choice.tsx'
import { Area, HoursAboveContext, Sheet } from '../ui/sheet.tsx'
import { TextField } from '../ui/text-field.tsx'
import { sampleDay, sampleNow } from './sample-day.ts'
import { sampleFrom, samplePassages, sampleToday, sampleUntil } from './sample-passages.ts'

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

/** A whole sheet put together from the parts, under the hour ruler, as a screen would. For building only. */
export function Component() {
  return (
    <HoursAboveContext value={true}>
      <div className="page">
        <div />
        <HourRuler items={sampleDay} now={sampleNow.time} nowMinute={sampleNow.minute} />
        <Sheet recipe="list-log">
          <Area className="grid grid-rows-[auto_minmax(0,1fr)]">
            <div className="sheet-head">
              <Cartouche place={words.logAbout} title={words.passages} source={passageWords.key} />
              <div className="sheet-tools">
                <div className="row row-between row-wrap">
                  <SegmentedChoice
                    label={words.view}
                    segments={[
                      { value: 'all', label: words.all },
                      { value: 'due', label: words.dueToday },
                      { value: 'overdue', label: words.overdueTwo },
                    ]}
                    value="all"
                    onChange={() => undefined}
                  />
                  <Button kind="primary" icon={Plus}>
                    {words.addStep}
                  </Button>
                </div>
                <PassageKey />
              </div>
            </div>
            <div className="scrolls">
              <PassageBoard
                passages={samplePassages}
                from={sampleFrom}
                until={sampleUntil}
                today={sampleToday}
                density="roomy"
              />
            </div>
          </Area>
          <LogColumn
            title={words.log}
            about={words.logAbout}
            entries={entries}
            foot={<TextField label={words.writeInLog} labelHidden placeholder={words.writeInLog} />}
          />
        </Sheet>
      </div>
    </HoursAboveContext>
  )
}
