import { QueryClientProvider } from '@tanstack/react-query'
import { expect, it } from 'vitest'
import { WaterInQuarantine } from '../../../src/features/animals/index.ts'
import { casesInWaterQuery } from '../../../src/features/animals/queries.ts'
import { createQueryClient } from '../../../src/lib/query-client.ts'
import { draw, drawsComponents } from '../../support/react.tsx'

drawsComponents()

const tank = '0197f000-0000-7000-8000-0000000000a1'

/** What is said before an animal is put into a tank with these cases in its water. */
async function saidOf(cases: { number: string; batchClosed: boolean }[], own?: string[]): Promise<string> {
  const client = createQueryClient()
  client.setQueryDefaults(['quarantine'], { staleTime: Infinity })
  client.setQueryData(casesInWaterQuery(tank).queryKey, cases)
  const { place } = await draw(
    <QueryClientProvider client={client}>
      <WaterInQuarantine enclosureId={tank} own={own} />
    </QueryClientProvider>,
  )
  return place.textContent ?? ''
}

const closed = { number: 'Q-014', batchClosed: true }

it('says that whoever comes into the water of a closed batch can start its clock again', async () => {
  expect(await saidOf([closed])).toBe(
    'Q-014 is in quarantine in this water. An animal that comes in can start its clock again.',
  )
})

it('says of an open batch that whoever belongs to it is entered in the case', async () => {
  expect(await saidOf([{ number: 'Q-015', batchClosed: false }])).toContain('Q-015')
  expect(await saidOf([{ number: 'Q-015', batchClosed: false }])).toContain('its batch is still open')
})

it('says nothing of the case that the animal is of, nor of water without one', async () => {
  expect(await saidOf([closed], ['Q-014'])).toBe('')
  expect(await saidOf([])).toBe('')
})
