import { classNames } from './class-names.ts'

export type QuantityKind = 'dose' | 'reading' | 'volume'

const noBreak = '\u00a0'

/**
 * A formatted quantity. The formatter of `shared/` made number and unit; this only sets them, never parts them, and
 * marks in the page which rule of writing holds (a dose has no trailing zero, a reading keeps its digits).
 *
 * @param number digits as formatted, for example `0.44` or `2,220`
 * @param unit   unit as written beside it, `''` for none (pH)
 * @param error  how exact a volume is, `± 2 %`
 */
export function Quantity({
  kind,
  number,
  unit,
  error,
  size = 'text',
  late = false,
}: {
  kind: QuantityKind
  number: string
  unit: string
  error?: string
  size?: 'text' | 'strong' | 'mid' | 'dose'
  /** Out of range or overdue; words beside it must say so too. */
  late?: boolean
}) {
  return (
    <span
      data-quantity={kind}
      className={classNames(
        size === 'strong' && 'quantity-strong',
        size === 'mid' && 'quantity-mid-size',
        size === 'dose' && 'quantity-dose-size',
        late && 'text-magenta',
      )}
    >
      {number}
      {unit ? (
        <>
          {noBreak}
          <span className={size === 'text' || size === 'strong' ? undefined : 'unit'}>{unit}</span>
        </>
      ) : null}
      {error ? (
        <span className="unit">
          {noBreak}
          {error.replaceAll(' ', noBreak)}
        </span>
      ) : null}
    </span>
  )
}
