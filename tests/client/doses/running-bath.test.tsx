import { QueryClientProvider } from '@tanstack/react-query'
import { describe, expect, it } from 'vitest'
import type { Me } from '../../../shared/contracts/sign-in.contract.ts'
import { OtherBaths } from '../../../src/features/doses/other-baths.tsx'
import { MeContext } from '../../../src/lib/me.ts'
import { createQueryClient } from '../../../src/lib/query-client.ts'
import { draw, drawsComponents } from '../../support/react.tsx'

drawsComponents()

const now = '2026-12-01T18:20:00.000Z'
const zone = 'America/Halifax'
const me: Me = {
  id: '0197f000-0000-7000-8000-000000000002',
  email: 'tech@harrow-point.example',
  printedName: 'Test technician',
  roles: ['technician'],
  mustChangePassword: false,
  licences: [],
  mayPractise: false,
  signingLockedUntil: null,
  preferences: {},
  facility: { name: 'Harrow Point Sea Hall', zone, gallon: null, demo: false },
}
const bath = (key: string, startedAt: string, endsAt: string) => ({
  doseId: `d${key}`,
  key,
  startedAt,
  endsAt,
  by: 'Test technician',
})

describe('other baths of the order that run at once', () => {
  it('stand beside its own, each with its time left, its start, its end and a way to end it', async () => {
    const { place } = await draw(
      <QueryClientProvider client={createQueryClient()}>
        <MeContext value={me}>
          <OtherBaths
            number="TO-0001"
            ownKey="1"
            baths={[
              bath('2', '2026-12-01T18:15:00.000Z', '2026-12-01T19:00:00.000Z'),
              bath('1', '2026-12-01T17:30:00.000Z', '2026-12-01T18:15:00.000Z'),
            ]}
            now={now}
            zone={zone}
            receivedMs={Date.now()}
            onEnd={() => undefined}
          />
        </MeContext>
      </QueryClientProvider>,
    )
    const [second, own] = [...place.querySelectorAll('li')]
    expect(second?.textContent).toMatch(/^Dose 2.*in since 14:15, ends 15:00/)
    expect(second?.querySelector('[role="timer"]')?.textContent).toMatch(/^(40:00|39:5\d)$/)
    expect(second?.querySelector('a')?.getAttribute('href')).toBe('/orders/TO-0001/sheet?dose=2')
    expect(own?.textContent).toContain('was to have ended at 14:15')
    expect(own?.querySelector('[role="timer"]')?.textContent).toMatch(/^over by 5:0\d$/)
    expect([...(own?.querySelectorAll('button') ?? [])].map((button) => button.textContent)).toEqual([
      'Stop the bath',
      'The bath has ended',
    ])
  })
})
