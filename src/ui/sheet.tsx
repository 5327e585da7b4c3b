import type { ComponentProps, ReactNode } from 'react'
import { classNames } from './class-names.ts'

export type SheetRecipe =
  | 'plain'
  | 'list'
  | 'board'
  | 'case'
  | 'order'
  | 'record'
  | 'enclosure'
  | 'register'

/**
 * The sheet inside its neat line. One task is one sheet; its children are areas, which meet at ink rules. The recipe
 * gives the columns and what becomes of them at 1200, 900 and 600 px.
 *
 * @param withoutHours no hour ruler above, so the sheet draws its own upper edge
 */
export function Sheet({
  recipe = 'plain',
  withoutHours = false,
  className,
  children,
}: {
  recipe?: SheetRecipe
  withoutHours?: boolean
  className?: string
  children: ReactNode
}) {
  return (
    <main id="chart" tabIndex={-1} className={classNames('chart', withoutHours && 'chart-without-hours')}>
      <div className={classNames('neat', `recipe-${recipe}`, className)}>{children}</div>
    </main>
  )
}

/** One area of a sheet: paper, land for what is settled or beside the work, shallow where work goes on now. */
export function Area({
  ground = 'paper',
  className,
  ...rest
}: { ground?: 'paper' | 'land' | 'shallow' } & ComponentProps<'div'>) {
  return <div {...rest} className={classNames('area', ground !== 'paper' && `area-${ground}`, className)} />
}
