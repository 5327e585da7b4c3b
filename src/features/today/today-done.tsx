import { useState } from 'react'
import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { todayWords } from '../../../shared/messages/today.ts'
import { Button } from '../../ui/button.tsx'
import { TodayItem } from './today-item.tsx'

/** What was done today, folded away. */
export function TodayDone({ items, at, zone }: { items: readonly TodayWork[]; at: string; zone: string }) {
  const [open, setOpen] = useState(false)
  if (items.length === 0) return null
  return (
    <section className="today-done" aria-label={todayWords.doneToday({ count: items.length })}>
      <div className="row row-wrap">
        <b>{todayWords.doneToday({ count: items.length })}</b>
        <Button size="small" aria-expanded={open} onClick={() => setOpen(!open)}>
          {open ? todayWords.hideDone : todayWords.showDone}
        </Button>
      </div>
      {open ? (
        <ol>
          {items.map((item) => (
            <TodayItem key={item.id} item={item} at={at} zone={zone} />
          ))}
        </ol>
      ) : null}
    </section>
  )
}
