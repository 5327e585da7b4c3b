import type { FormattedQuantity } from '../../../shared/domain/quantities/formatted-quantity.ts'
import { Quantity } from '../../ui/quantity.tsx'

const noBreak = '\u00a0'

/** A quantity that the server wrote, taken apart again for setting: "4.36 g" is 4.36 and g. */
export function quantityOfText(
  text: string,
  kind: FormattedQuantity['kind'],
): Pick<FormattedQuantity, 'kind' | 'text' | 'number'> {
  const [number = text] = text.split(noBreak)
  return { kind, text, number }
}

/** A dose as the server's one formatter wrote it. */
export function DoseText({
  text,
  size = 'text',
  kind = 'dose',
}: {
  text: string
  size?: 'text' | 'strong' | 'mid' | 'dose'
  kind?: FormattedQuantity['kind']
}) {
  return <Quantity of={quantityOfText(text, kind)} size={size} />
}
