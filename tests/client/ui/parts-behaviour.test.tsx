import { act, useState } from 'react'
import { describe, expect, it, vi } from 'vitest'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { formatVolumeWithError } from '../../../shared/domain/quantities/format-volume-with-error.ts'
import { Button } from '../../../src/ui/button.tsx'
import { CautionBlock, sortCautions } from '../../../src/ui/caution-block.tsx'
import { LogColumn } from '../../../src/ui/log-column.tsx'
import { Menu } from '../../../src/ui/menu.tsx'
import { PasswordField } from '../../../src/ui/password-field.tsx'
import { Quantity } from '../../../src/ui/quantity.tsx'
import { Stepper } from '../../../src/ui/stepper.tsx'
import { ToastProvider } from '../../../src/ui/toast.tsx'
import { useToast } from '../../../src/ui/toast-context.ts'
import { useSheetKeys } from '../../../src/ui/use-sheet-keys.ts'
import { click, draw, drawsComponents, focus, named, one, press } from '../../support/react.tsx'

drawsComponents()

describe('a shut button', () => {
  it('can be reached and says what opens it, but does nothing', async () => {
    const onClick = vi.fn()
    const { place } = await draw(
      <Button shut="Choose the use first" onClick={onClick} type="submit">
        Sign order
      </Button>,
    )
    const button = one<HTMLButtonElement>(place, 'button')
    expect(button.disabled).toBe(false)
    expect(button.getAttribute('aria-disabled')).toBe('true')
    expect(button.type).toBe('button')
    expect(document.getElementById(button.getAttribute('aria-describedby') ?? '')?.textContent).toBe(
      'Choose the use first',
    )
    await click(button)
    expect(onClick).not.toHaveBeenCalled()
  })
})

describe('a quantity', () => {
  it('is one text with its unit, and says whether it is a dose, a reading or a volume', async () => {
    const { place } = await draw(
      <>
        <Quantity of={formatDose('0.440', 'g')} size="dose" />
        <Quantity of={formatReading({ value: '0.00', unit: 'mg/L' })} />
        <Quantity of={formatVolumeWithError(2217.6, 2)} size="mid" />
        <Quantity of={formatReading({ value: '7.0', unit: 'pH' })} size="mid" />
      </>,
    )
    const shown = [...place.querySelectorAll<HTMLElement>('[data-quantity]')]
    expect(shown.map((quantity) => [quantity.dataset.quantity, quantity.textContent])).toEqual([
      ['dose', '0.44\u00a0g'],
      ['reading', '0.00\u00a0mg/L'],
      ['volume', '2,220\u00a0L\u00a0±\u00a02\u00a0%'],
      ['reading', 'pH\u00a07.0'],
    ])
  })
})

describe('a caution', () => {
  it('keeps its look when overridden, and a stop that can’t be overridden offers no field', async () => {
    const { place } = await draw(
      <>
        <CautionBlock level="stop" answer="Overridden by Dr I. Marrow 14:12">
          Copper
        </CautionBlock>
        <CautionBlock level="stop" cannotOverride override={<input />}>
          Oxygen
        </CautionBlock>
      </>,
    )
    expect(place.querySelectorAll('.caution-stop')).toHaveLength(2)
    expect(place.querySelector('input')).toBeNull()
    expect(place.textContent).toContain('can’t be overridden')
  })

  it('stands before warnings and notes', () => {
    const sorted = sortCautions([{ level: 'note' }, { level: 'stop' }, { level: 'warning' }] as const)
    expect(sorted.map((caution) => caution.level)).toEqual(['stop', 'warning', 'note'])
  })
})

describe('a stepper', () => {
  function Dead() {
    const [value, setValue] = useState<number | null>(null)
    return <Stepper label="Found dead" value={value} onChange={setValue} />
  }

  it('begins "not set", which is not 0', async () => {
    const { place } = await draw(<Dead />)
    const said = () => one(place, 'output').textContent
    expect(said()).toBe('not set')
    await click(named(place, 'One less'))
    expect(said()).toBe('0')
    await click(named(place, 'One more'))
    await click(named(place, 'One more'))
    expect(said()).toBe('2')
    await click(named(place, 'One less'))
    expect(said()).toBe('1')
  })
})

describe('a password', () => {
  it('can be shown and hidden again', async () => {
    const { place } = await draw(<PasswordField label="Password" />)
    const field = one<HTMLInputElement>(place, 'input')
    expect(field.type).toBe('password')
    await click(named(place, 'Show the password'))
    expect(field.type).toBe('text')
    await click(named(place, 'Hide the password'))
    expect(field.type).toBe('password')
  })
})

describe('a menu', () => {
  const menu = (
    <Menu label="Sheets" face="Sheets">
      {(close) => (
        <>
          {['Today', 'Quarantine', 'Water'].map((name) => (
            <button key={name} role="menuitem" tabIndex={-1} onClick={close}>
              {name}
            </button>
          ))}
        </>
      )}
    </Menu>
  )

  it('opens on its first item, moves by arrows, Home, End and first letter, and closes with Esc', async () => {
    const { place } = await draw(menu)
    const button = one(place, '[aria-haspopup="menu"]')
    await focus(button)
    await press('ArrowDown')
    expect(document.activeElement?.textContent).toBe('Today')
    await press('ArrowDown')
    expect(document.activeElement?.textContent).toBe('Quarantine')
    await press('End')
    expect(document.activeElement?.textContent).toBe('Water')
    await press('ArrowDown')
    expect(document.activeElement?.textContent).toBe('Today')
    await press('q')
    expect(document.activeElement?.textContent).toBe('Quarantine')
    expect((await press('Escape')).defaultPrevented).toBe(true)
    expect(place.querySelector('[role="menu"]')).toBeNull()
    expect(document.activeElement).toBe(button)
  })
})

describe('a toast', () => {
  function Saying({ run }: { run: () => void }) {
    const toast = useToast()
    return (
      <Button onClick={() => toast({ words: 'Observation saved at 14:20', act: { words: 'Undo', run } })}>
        Save
      </Button>
    )
  }

  it('is announced politely, can be undone, and goes after 6 seconds', async () => {
    vi.useFakeTimers()
    try {
      const run = vi.fn()
      const { place } = await draw(
        <ToastProvider>
          <Saying run={run} />
        </ToastProvider>,
      )
      await click(named(place, 'Save'))
      expect(one(place, '[role="status"]').textContent).toContain('Observation saved at 14:20')
      await act(async () => vi.advanceTimersByTime(5900))
      expect(place.textContent).toContain('Undo')
      await act(async () => vi.advanceTimersByTime(200))
      expect(place.textContent).not.toContain('Undo')
      await click(named(place, 'Save'))
      await click(named(place, 'Undo'))
      expect(run).toHaveBeenCalledOnce()
      expect(place.textContent).not.toContain('Undo')
    } finally {
      vi.useRealTimers()
    }
  })

  it('waits while somebody reads it', async () => {
    vi.useFakeTimers()
    try {
      const { place } = await draw(
        <ToastProvider>
          <Saying run={() => undefined} />
        </ToastProvider>,
      )
      await click(named(place, 'Save'))
      await focus(named(place, 'Undo'))
      await act(async () => vi.advanceTimersByTime(60_000))
      expect(place.textContent).toContain('Undo')
    } finally {
      vi.useRealTimers()
    }
  })
})

describe('the keys of the frame', () => {
  const heard = { onSheet: vi.fn(), onFind: vi.fn(), onKeyList: vi.fn() }
  function Keys({ on = true }: { on?: boolean }) {
    useSheetKeys({ singleKeys: on, ...heard })
    return (
      <>
        <button type="button">Elsewhere</button>
        <input aria-label="Typing" />
      </>
    )
  }
  const listen = async (on = true) => {
    for (const handler of Object.values(heard)) handler.mockClear()
    const { place } = await draw(<Keys on={on} />)
    await focus(one(place, 'button'))
    return place
  }

  it('go to a sheet by g and its number, one after the other', async () => {
    await listen()
    await press('g')
    await press('3')
    expect(heard.onSheet).toHaveBeenCalledExactlyOnceWith(3)
    await press('4')
    expect(heard.onSheet).toHaveBeenCalledOnce()
    await press('g')
    await press('9')
    expect(heard.onSheet).toHaveBeenCalledOnce()
  })

  it('forget the g after one and a half seconds', async () => {
    await listen()
    const at = vi.spyOn(Event.prototype, 'timeStamp', 'get')
    at.mockReturnValue(1000)
    await press('g')
    at.mockReturnValue(2600)
    await press('3')
    expect(heard.onSheet).not.toHaveBeenCalled()
  })

  it('find with Ctrl K and /, and list the keys with ?', async () => {
    await listen()
    await press('k', { ctrlKey: true })
    await press('k', { metaKey: true })
    await press('/')
    await press('?')
    expect(heard.onFind).toHaveBeenCalledTimes(3)
    expect(heard.onKeyList).toHaveBeenCalledOnce()
  })

  it('never act while somebody types, except Ctrl K', async () => {
    const place = await listen()
    await focus(one(place, 'input'))
    await press('g')
    await press('3')
    await press('/')
    await press('?')
    expect(heard.onSheet).not.toHaveBeenCalled()
    expect(heard.onFind).not.toHaveBeenCalled()
    await press('k', { ctrlKey: true })
    expect(heard.onFind).toHaveBeenCalledOnce()
  })

  it('can be turned off', async () => {
    await listen(false)
    await press('g')
    await press('3')
    await press('?')
    expect(heard.onSheet).not.toHaveBeenCalled()
    expect(heard.onKeyList).not.toHaveBeenCalled()
    await press('k', { ctrlKey: true })
    expect(heard.onFind).toHaveBeenCalledOnce()
  })
})

describe('the log', () => {
  const entry = {
    key: '1',
    day: 'Today',
    time: '13:52',
    instant: '2026-05-14T13:52:00-04:00',
    what: 'All ate.',
    who: 'T. Okafor-Lind, keeper',
  }
  const log = <LogColumn title="Ship’s log" entries={[entry]} foot={<button type="button">Write</button>} />
  const narrow = (is: boolean) =>
    vi.spyOn(window, 'matchMedia').mockImplementation(
      (query) =>
        ({
          matches: is,
          media: query,
          addEventListener: () => undefined,
          removeEventListener: () => undefined,
        }) as unknown as MediaQueryList,
    )

  it('takes the focus with L, and N starts an entry', async () => {
    narrow(false)
    const { place } = await draw(log)
    await press('l')
    expect(document.activeElement).toBe(one(place, 'aside'))
    await press('n')
    expect(document.activeElement?.textContent).toBe('Write')
  })

  it('is a drawer on a narrow screen, opened by its strip or L, closed by Esc', async () => {
    narrow(true)
    const { place } = await draw(log)
    expect(place.querySelector('aside')).toBeNull()
    await press('L')
    expect(one<HTMLDialogElement>(place, 'dialog').open).toBe(true)
    expect(place.textContent).toContain('T. Okafor-Lind, keeper')
    await press('Escape')
    expect(place.querySelector('dialog')).toBeNull()
    await click(named(place, /1\u00a0entry/))
    expect(place.querySelector('dialog')).not.toBeNull()
  })
})
