import type { ReactNode } from 'react'
import { Cartouche } from '../../ui/cartouche.tsx'
import { EmptyHarbour } from '../../ui/empty-harbour.tsx'
import { Sheet } from '../../ui/sheet.tsx'

/** A sheet with nothing on it but words: not in this version, nothing at this address, stopped working. */
export function PlainSheet({
  place,
  title,
  children,
  acts,
  alert = false,
}: {
  place?: string
  title: string
  children: ReactNode
  acts?: ReactNode
  alert?: boolean
}) {
  return (
    <Sheet recipe="plain">
      <div role={alert ? 'alert' : undefined}>
        <div className="max-w-[392px]">
          <Cartouche place={place} title={title} />
        </div>
        <div className="pane stack max-w-[60ch]">
          <EmptyHarbour />
          {children}
          {acts ? <div className="row row-wrap">{acts}</div> : null}
        </div>
      </div>
    </Sheet>
  )
}
