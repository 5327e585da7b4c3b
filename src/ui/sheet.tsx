import { createContext, useContext } from 'react'
import type { ComponentProps, ReactNode } from 'react'
import { classNames } from './class-names.ts'

export type SheetRecipe =
  'plain' | 'list-log' | 'list' | 'board' | 'case' | 'order' | 'record' | 'enclosure' | 'register' | 'history'

/** Whether an hour ruler stands above the sheet and is its upper edge. The frame says so. */
export const HoursAboveContext = createContext(false)

/**
 * The sheet inside its neat line. One task is one sheet; its children are areas, which meet at ink rules. The recipe
 * gives the columns and what becomes of them at 1200, 900 and 600 px.
 */
export function Sheet({
  recipe = 'plain',
  className,
  children,
}: {
  recipe?: SheetRecipe
  className?: string
  children: ReactNode
}) {
  const hoursAbove = useContext(HoursAboveContext)
  return (
    <main id="chart" tabIndex={-1} className={classNames('chart', !hoursAbove && 'chart-without-hours')}>
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
