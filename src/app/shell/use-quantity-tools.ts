import { useEffect, useState } from 'react'
import type { QuantityTools } from '../../ui/quantity-context.ts'

/**
 * The tools of number fields, with the facility's gallon. They come after the first screen, which has no number field
 * and should not wait for the table of units; until then a field takes plain numbers.
 */
export function useQuantityTools(gallon: 'us' | 'imperial' | null): QuantityTools {
  const [tools, setTools] = useState<QuantityTools>({})
  useEffect(() => {
    let wanted = true
    import('../../lib/quantity-tools.ts').then(
      ({ quantityTools }) => {
        if (wanted) setTools(quantityTools(gallon ?? undefined))
      },
      // without a signal the fields go on taking plain numbers; the next load of the page tries again
      () => undefined,
    )
    return () => {
      wanted = false
    }
  }, [gallon])
  return tools
}
