import { useState } from 'react'
import { expect, it, vi } from 'vitest'
import { Button } from '../../../src/ui/button.tsx'
import { Dialog } from '../../../src/ui/dialog.tsx'
import { click, draw, drawsComponents, focus, named, one, press } from '../../support/react.tsx'

drawsComponents()

function Stopping({ typed = false, onStop = () => undefined }: { typed?: boolean; onStop?: () => void }) {
  const [open, setOpen] = useState(false)
  return (
    <>
      <Button onClick={() => setOpen(true)}>Stop</Button>
      {open ? (
        <Dialog
          question="Stop order TO-0728?"
          typed={typed}
          onBack={() => setOpen(false)}
          acts={
            <>
              <Button onClick={onStop}>Stop the order</Button>
              <Button onClick={() => setOpen(false)}>Keep it running</Button>
            </>
          }
        >
          <input aria-label="Why" data-first-focus />
        </Dialog>
      ) : null}
    </>
  )
}

const isOpen = (place: HTMLElement) => place.querySelector('dialog')?.open ?? false

it('is a dialog named by its question, with the act first and the way back second', async () => {
  const { place } = await draw(<Stopping />)
  await click(named(place, 'Stop'))
  const dialog = one<HTMLDialogElement>(place, 'dialog')
  expect(dialog.open).toBe(true)
  expect(document.getElementById(dialog.getAttribute('aria-labelledby') ?? '')?.textContent).toBe(
    'Stop order TO-0728?',
  )
  expect([...dialog.querySelectorAll('button')].map((button) => button.textContent)).toEqual([
    'Stop the order',
    'Keep it running',
  ])
})

it('puts the focus where it is told, and gives it back', async () => {
  const { place } = await draw(<Stopping />)
  const opener = named(place, 'Stop')
  await focus(opener)
  await click(opener)
  expect(document.activeElement).toBe(one(place, 'input'))
  await click(named(place, 'Keep it running'))
  expect(isOpen(place)).toBe(false)
  expect(document.activeElement).toBe(opener)
})

it('goes back with Esc', async () => {
  const onStop = vi.fn()
  const { place } = await draw(<Stopping onStop={onStop} />)
  await click(named(place, 'Stop'))
  await press('Escape')
  expect(isOpen(place)).toBe(false)
  expect(onStop).not.toHaveBeenCalled()
})

it('asks before it throws away what was typed', async () => {
  const { place } = await draw(<Stopping typed />)
  await click(named(place, 'Stop'))
  await press('Escape')
  expect(isOpen(place)).toBe(true)
  expect(place.textContent).toContain('Throw away what you typed?')
  await click(named(place, 'Keep typing'))
  expect(isOpen(place)).toBe(true)
  await press('Escape')
  await click(named(place, 'Throw it away'))
  expect(isOpen(place)).toBe(false)
})

it('stays when Esc was meant for something inside it', async () => {
  const { place } = await draw(<Stopping />)
  await click(named(place, 'Stop'))
  one(place, 'input').addEventListener('keydown', (event) => event.preventDefault())
  await press('Escape')
  expect(isOpen(place)).toBe(true)
})

it('goes back when somebody presses beside it', async () => {
  const { place } = await draw(<Stopping />)
  await click(named(place, 'Stop'))
  await click(one(place, 'dialog'))
  expect(isOpen(place)).toBe(false)
})
