import type { ReactNode } from 'react'
import { Cartouche } from './cartouche.tsx'
import { Area, Sheet } from './sheet.tsx'
import { useMedia } from './use-media.ts'

/**
 * A sheet that is a list: title and tools beside the rows. Where they stand above the rows, on a tablet or phone, only
 * what leads to a row stays there, so that the first rows are on the first screen; `acts` follow the rows.
 */
export function ListSheet({
  place,
  title,
  source,
  pages,
  primary,
  search,
  filters,
  acts,
  children,
}: {
  place?: ReactNode
  title: string
  source?: ReactNode
  /** Links to the sheets beside this one. */
  pages?: ReactNode
  /** The act that people come for, such as entering a new one. */
  primary?: ReactNode
  search?: ReactNode
  filters?: ReactNode
  /** Acts used less, such as a download. */
  acts?: ReactNode
  children: ReactNode
}) {
  const besideTheList = useMedia('(min-width: 901px)')
  const moreActs = acts ? <div className="row row-wrap">{acts}</div> : null
  const tools = [pages, primary, search, filters, besideTheList && acts].some(Boolean)
  return (
    <Sheet recipe="list">
      <Area>
        <Cartouche place={place} title={title} source={source} />
        {tools ? (
          <div className="pane list-tools">
            {pages}
            {primary ? <div className="list-primary">{primary}</div> : null}
            {search}
            {filters}
            {besideTheList ? moreActs : null}
          </div>
        ) : null}
      </Area>
      <Area className="pane stack gap-4">
        {children}
        {besideTheList ? null : moreActs}
      </Area>
    </Sheet>
  )
}
