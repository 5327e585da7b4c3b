import { useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import { QuantityField } from '../../../src/ui/quantity-field.tsx'
import type { QuantityFieldProps } from '../../../src/ui/quantity-field.tsx'
import { readQuantityText } from '../../../src/ui/quantity-text.ts'
import type { TypedQuantity } from '../../../src/ui/use-quantity-field.ts'
import {
  choose,
  click,
  draw,
  drawsComponents,
  focus,
  leave,
  named,
  one,
  press,
  type,
} from '../../support/react.tsx'

drawsComponents()

const litresAndGallons = [{ unit: 'L' }, { unit: 'gal_us', label: 'US gal' }]
const toGallons = (value: string) => ({ ok: true as const, value: String(Number(value) / 4) })

function Volume(
  props: Partial<QuantityFieldProps> & { start?: TypedQuantity; onQuantity?: (q: TypedQuantity) => void },
) {
  const [quantity, setQuantity] = useState(props.start ?? { value: '', unit: 'L' })
  return (
    <QuantityField
      label="Volume"
      units={litresAndGallons}
      {...props}
      quantity={quantity}
      onChange={(next) => {
        setQuantity(next)
        props.onQuantity?.(next)
      }}
    />
  )
}

const input = (place: HTMLElement) => one<HTMLInputElement>(place, 'input')
const wrong = (place: HTMLElement) => place.querySelector('.wrong')?.textContent ?? null
const enter = async (place: HTMLElement, text: string) => {
  await type(input(place), text)
  await leave(input(place))
}

describe('a number with its unit', () => {
  it('gives the digits as typed, beside their unit', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume onQuantity={onQuantity} />)
    await enter(place, '0.10')
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '0.10', unit: 'L' })
    expect(input(place).inputMode).toBe('decimal')
  })

  it('completes a bare point when it is left, since ".5" is read as 5', async () => {
    const { place } = await draw(<Volume />)
    await enter(place, '.5')
    expect(input(place).value).toBe('0.5')
  })

  it('refuses two separators, and says what to type', async () => {
    const { place } = await draw(<Volume />)
    await enter(place, '1,200.5')
    expect(wrong(place)).toMatch(/one decimal point/)
    expect(input(place).getAttribute('aria-invalid')).toBe('true')
    expect(input(place).value).toBe('1,200.5')
  })

  it('refuses what can be read as thousands and as a decimal, naming both', async () => {
    const { place } = await draw(<Volume />)
    await enter(place, '11,400')
    expect(wrong(place)).toContain('11400')
    expect(wrong(place)).toContain('11.400')
  })

  it('says nothing while somebody still types, and takes the fault away once it is mended', async () => {
    const { place } = await draw(<Volume />)
    await type(input(place), '1.2.')
    expect(wrong(place)).toBeNull()
    await leave(input(place))
    expect(wrong(place)).not.toBeNull()
    await type(input(place), '1.2')
    expect(wrong(place)).toBeNull()
  })

  it('refuses a number below 0 where none can be', async () => {
    const { place } = await draw(<Volume />)
    await enter(place, '−41')
    expect(wrong(place)).toMatch(/not below 0/)
  })

  it('allows it where it can', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume allowNegative onQuantity={onQuantity} />)
    await enter(place, '−41')
    expect(wrong(place)).toBeNull()
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '-41', unit: 'L' })
  })

  it('does not change with the wheel', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume start={{ value: '12', unit: 'L' }} onQuantity={onQuantity} />)
    await focus(input(place))
    input(place).dispatchEvent(new WheelEvent('wheel', { deltaY: 100, bubbles: true }))
    expect(input(place).type).toBe('text')
    expect(onQuantity).not.toHaveBeenCalled()
  })
})

describe('arithmetic', () => {
  const evaluate = vi.fn(async () => ({ ok: true as const, value: '2.88' }))

  it('is worked out when the field is left, in the field’s own unit, and stays visible', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume evaluate={evaluate} onQuantity={onQuantity} />)
    await enter(place, '2.4 * 1.2')
    expect(evaluate).toHaveBeenLastCalledWith('2.4 * 1.2', 'L')
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '2.88', unit: 'L' })
    expect(place.textContent).toContain('2.4 * 1.2 = 2.88\u00a0L')
  })

  it('is worked out by Enter, which must not send the form first', async () => {
    const { place } = await draw(<Volume evaluate={evaluate} />)
    await type(input(place), '2.4 * 1.2')
    expect((await press('Enter')).defaultPrevented).toBe(true)
    expect(input(place).value).toBe('2.88')
    expect((await press('Enter')).defaultPrevented).toBe(false)
  })

  it('keeps the text and says so when it can’t be worked out', async () => {
    const { place } = await draw(
      <Volume evaluate={async () => ({ ok: false, says: 'No such unit: furlong.' })} />,
    )
    await enter(place, '3 furlong + 1')
    expect(wrong(place)).toBe('No such unit: furlong.')
    expect(input(place).value).toBe('3 furlong + 1')
  })

  it('drops an answer that comes after somebody typed on', async () => {
    let answer: (value: { ok: true; value: string }) => void = () => undefined
    const slow = () => new Promise<{ ok: true; value: string }>((resolve) => (answer = resolve))
    const { place } = await draw(<Volume evaluate={slow} />)
    await enter(place, '1 + 1')
    await type(input(place), '7')
    answer({ ok: true, value: '2' })
    await leave(input(place))
    expect(input(place).value).toBe('7')
  })
})

describe('a changed unit', () => {
  const start = { value: '38', unit: 'L' }
  const select = (place: HTMLElement) => one<HTMLSelectElement>(place, 'select')

  it('is simply taken while there is no number', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume onQuantity={onQuantity} />)
    await choose(select(place), 'gal_us')
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '', unit: 'gal_us' })
  })

  it('asks whether the number is kept or converted, and changes nothing before the answer', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume start={start} convert={toGallons} onQuantity={onQuantity} />)
    await choose(select(place), 'gal_us')
    expect(onQuantity).not.toHaveBeenCalled()
    expect(document.activeElement?.textContent).toBe('Keep 38\u00a0US gal')
    await click(named(place, 'Convert to 9.5\u00a0US gal'))
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '9.5', unit: 'gal_us' })
  })

  it('keeps the number when told to', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume start={start} convert={toGallons} onQuantity={onQuantity} />)
    await choose(select(place), 'gal_us')
    await click(named(place, /^Keep/))
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '38', unit: 'gal_us' })
  })

  it('goes back with Esc, and the dialog around it stays', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume start={start} convert={toGallons} onQuantity={onQuantity} />)
    await choose(select(place), 'gal_us')
    expect((await press('Escape')).defaultPrevented).toBe(true)
    expect(select(place).value).toBe('L')
    expect(onQuantity).not.toHaveBeenCalled()
  })

  it('is the unit of the number that is typed next, whatever was asked; until then the old one is seen', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume start={start} convert={toGallons} onQuantity={onQuantity} />)
    await choose(select(place), 'gal_us')
    expect(select(place).value).toBe('L')
    await type(input(place), '2')
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '2', unit: 'gal_us' })
    expect(select(place).value).toBe('gal_us')
    expect(place.textContent).not.toContain('Keep')
  })

  it('is simply taken beside text that is no number, and stays when a number is typed', async () => {
    const onQuantity = vi.fn()
    const { place } = await draw(<Volume onQuantity={onQuantity} />)
    await enter(place, '12 ppm')
    await choose(select(place), 'gal_us')
    await type(input(place), '12')
    expect(onQuantity).toHaveBeenLastCalledWith({ value: '12', unit: 'gal_us' })
    expect(select(place).value).toBe('gal_us')
  })

  it('offers no conversion between units that have none', async () => {
    const { place } = await draw(<Volume start={start} convert={() => ({ ok: false })} />)
    await choose(select(place), 'gal_us')
    expect(place.textContent).not.toMatch(/convert/i)
    expect(place.textContent).toContain('Nothing here turns L into US gal. Is the number one of US gal?')
  })
})

it.each([
  ['', 'empty'],
  ['0.68', 'number'],
  ['2.4 * 1.2', 'arithmetic'],
  ['38 gal + 12 L', 'arithmetic'],
  ['12 L', 'arithmetic'],
  ['deep', 'refused'],
  ['1.2.3', 'refused'],
])('reads %j as %s', (typed, kind) => {
  expect(readQuantityText(typed).kind).toBe(kind)
})
