import type { ComponentProps } from 'react'
import { Quantity } from '../../ui/quantity.tsx'

/** More characters than this do not stand beside anything on a phone. */
const longest = 18

/** A quantity; a figure of thirty zeros is shown whole, and breaks within its digits and not the sheet. */
export function LongQuantity(props: ComponentProps<typeof Quantity>) {
  return props.of.text.length > longest ? (
    <span className="bench-long">
      <Quantity {...props} />
    </span>
  ) : (
    <Quantity {...props} />
  )
}
