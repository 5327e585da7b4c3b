import type { FormattedQuantity } from '../../shared/domain/quantities/formatted-quantity.ts'
import { classNames } from './class-names.ts'

const noBreak = '\u00a0'

/**
 * A formatted quantity. The formatters of `shared/domain/quantities` made it; this only sets it, never parts number and
 * unit, and marks in the page which rule of writing holds (a dose has no trailing zero, a reading keeps its digits).
 *
 * In the two large sizes the unit is set smaller, beside the number it belongs to.
 */
export function Quantity({
  of,
  size = 'text',
  late = false,
}: {
  of: Pick<FormattedQuantity, 'kind' | 'text' | 'number'>
  size?: 'text' | 'strong' | 'mid' | 'dose'
  /** Out of range or overdue; words beside it must say so too. */
  late?: boolean
}) {
  const large = size === 'mid' || size === 'dose'
  const unitFollows = of.text.startsWith(of.number)
  return (
    <span
      data-quantity={of.kind}
      className={classNames(
        size === 'strong' && 'quantity-strong',
        size === 'mid' && 'quantity-mid-size',
        size === 'dose' && 'quantity-dose-size',
        late && 'text-magenta',
      )}
    >
      {large && unitFollows ? (
        <>
          {of.number}
          {/* what follows the number: unit, and the error of a volume */}
          <span className="unit">{of.text.slice(of.number.length) || noBreak}</span>
        </>
      ) : (
        of.text
      )}
    </span>
  )
}
