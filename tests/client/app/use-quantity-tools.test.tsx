import { act, useState } from 'react'
import { beforeAll, expect, it, vi } from 'vitest'
import { useQuantityTools } from '../../../src/app/shell/use-quantity-tools.ts'
import { QuantityToolsContext } from '../../../src/ui/quantity-context.ts'
import { QuantityField } from '../../../src/ui/quantity-field.tsx'
import { draw, drawsComponents, leave, one, type } from '../../support/react.tsx'

drawsComponents()

// loaded here, so that a busy machine does not count it against the first test
beforeAll(async () => {
  await Promise.all([import('mathjs'), import('../../../src/lib/quantity-tools.ts')])
}, 60_000)

/** Waits inside `act`, as state changes when a module or an answer arrives. */
const eventually = (check: () => void) => act(() => vi.waitFor(check, { timeout: 4000 }))

/** A field as it stands below the frame of the application. */
function BelowFrame({ gallon }: { gallon: 'us' | 'imperial' | null }) {
  const tools = useQuantityTools(gallon)
  const [quantity, setQuantity] = useState({ value: '', unit: 'L' })
  return (
    <QuantityToolsContext value={tools}>
      <output>{tools.evaluate ? 'ready' : 'waiting'}</output>
      <QuantityField label="Volume" units={[{ unit: 'L' }]} quantity={quantity} onChange={setQuantity} />
    </QuantityToolsContext>
  )
}

async function typed(gallon: 'us' | 'imperial' | null, text: string) {
  const { place } = await draw(<BelowFrame gallon={gallon} />)
  await eventually(() => expect(place.querySelector('output')?.textContent).toBe('ready'))
  await type(one<HTMLInputElement>(place, 'input'), text)
  await leave(one<HTMLInputElement>(place, 'input'))
  return place
}

const value = (place: HTMLElement) => one<HTMLInputElement>(place, 'input').value

it('works out arithmetic with the gallon of the facility', async () => {
  const us = await typed('us', '38 gal + 12 L')
  await eventually(() => expect(value(us)).toBe('155.845647792'))
  const imperial = await typed('imperial', '38 gal + 12 L')
  await eventually(() => expect(value(imperial)).toBe('184.75142'))
})

it('asks which gallon where the facility has not said', async () => {
  const place = await typed(null, '38 gal + 12 L')
  await eventually(() => expect(place.textContent).toContain('Choose US gal or imperial gal.'))
  expect(value(place)).toBe('38 gal + 12 L')
})
