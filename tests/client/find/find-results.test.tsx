import { QueryClientProvider } from '@tanstack/react-query'
import { act } from 'react'
import { expect, it, vi } from 'vitest'
import { FindResults } from '../../../src/features/find/index.ts'
import { createQueryClient } from '../../../src/lib/query-client.ts'
import { FindDialog } from '../../../src/ui/find-dialog.tsx'
import { draw, drawsComponents, named, one, press, type } from '../../support/react.tsx'

drawsComponents()

const asked: string[] = []
const row = (key: string, name: string, note = '') => ({ key, name, note })
const groups = [
  { kind: 'animal', rows: [row('HP-0412', 'HP-0412 Southern stingray', 'QT-6')], total: 1 },
  { kind: 'order', rows: [row('TO-0719', 'TO-0719, praziquantel'), row('TO-0720', 'TO-0720')], total: 11 },
]

const pause = () => act(() => new Promise((resolve) => setTimeout(resolve, 260)))

async function opened(onBack = () => undefined as void) {
  asked.length = 0
  vi.spyOn(globalThis, 'fetch').mockImplementation(async (address) => {
    asked.push(String(address))
    return new Response(JSON.stringify({ groups: String(address).includes('nothing') ? [] : groups }))
  })
  const client = createQueryClient()
  const { place } = await draw(
    <QueryClientProvider client={client}>
      <FindDialog onBack={onBack}>{(text) => <FindResults text={text} onGo={onBack} />}</FindDialog>
    </QueryClientProvider>,
  )
  return { place, field: one<HTMLInputElement>(place, 'input[type=search]'), client }
}

it('asks once somebody pauses, and shows what was found by kind, as links', async () => {
  const { place, field, client } = await opened()
  await type(field, 'r')
  await pause()
  expect(asked).toEqual([])
  await type(field, 'ra')
  await pause()
  expect(asked).toEqual(['/api/find?q=ra'])
  await type(field, 'ray')
  await type(field, 'ray ')
  await type(field, 'ray f')
  await pause()
  expect(asked).toEqual(['/api/find?q=ra', '/api/find?q=ray+f'])
  expect([...place.querySelectorAll('h3')].map((one) => one.textContent)).toEqual(['Animals', 'Orders'])
  expect(named(place, /HP-0412 Southern stingray/).getAttribute('href')).toBe('/animals/HP-0412')
  expect(place.textContent).toContain('and 9 more')
  client.clear()
})

it('is walked with the arrows, from the field to the finds and back', async () => {
  const { place, field, client } = await opened()
  await type(field, 'ray')
  await pause()
  const links = [...place.querySelectorAll<HTMLElement>('.found a')]
  await press('ArrowDown')
  expect(document.activeElement).toBe(links[0])
  await press('ArrowDown')
  await press('ArrowDown')
  await press('ArrowDown')
  expect(document.activeElement).toBe(links[2])
  await press('ArrowUp')
  await press('ArrowUp')
  await press('ArrowUp')
  expect(document.activeElement).toBe(field)
  client.clear()
})

it('says that nothing was found', async () => {
  const { place, field, client } = await opened()
  await type(field, 'nothing')
  await pause()
  expect(place.textContent).toContain('Nothing found for “nothing”.')
  expect(one(place, '[role="status"]').textContent).toBe('Nothing found for “nothing”.')
  client.clear()
})

it('gives the keys back to the field when the find that held them goes', async () => {
  const { place, field, client } = await opened()
  await type(field, 'ray')
  await pause()
  // the answer to the whole text comes late, and lacks what the keys are on by then
  await type(field, 'nothing')
  await press('ArrowDown')
  expect(document.activeElement?.textContent).toMatch('HP-0412')
  await pause()
  await pause()
  expect(document.activeElement).toBe(field)
  expect(place.textContent).toContain('Nothing found')
  client.clear()
})
