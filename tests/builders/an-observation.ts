import type { BodyOf } from '../../shared/contracts/contract.ts'
import type { recordObservation } from '../../shared/contracts/observations.contract.ts'
import { nothingSaid } from '../../shared/domain/observations/observation.ts'
import type { TestApi } from '../support/api.ts'

export type ObservationBody = BodyOf<typeof recordObservation>

/** An observation as a phone sends it; says nothing unless told. */
export function anObservation(
  api: TestApi,
  enclosure: string,
  said: Partial<ObservationBody> = {},
): ObservationBody {
  return {
    ...nothingSaid,
    signs: [],
    id: api.nextId(),
    schemaVersion: 1,
    origin: 'online',
    device: 'test phone',
    happenedAt: '2026-12-01T18:00:00Z',
    enclosure,
    deaths: [],
    ...said,
  }
}
