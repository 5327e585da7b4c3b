import type { TestApi } from '../support/api.ts'

/** What a builder gives: the enclosure and its own body of water. */
export interface BuiltEnclosure {
  id: string
  code: string
  waterBodyId: string
}

const context = async (api: TestApi) => {
  const technician = await api.as('technician')
  return {
    actor: { personId: technician.id, printedName: technician.printedName, roles: ['technician' as const] },
    requestId: 'test',
  }
}

/** In use since well before the tests' fixed day, so that facts of the past have a place. */
export const longAgo = '2026-01-01T00:00:00Z'

/** An enclosure built through its service: a plain tank unless told. */
export async function anEnclosure(
  api: TestApi,
  code: string,
  given: {
    name?: string
    area?: string
    kind?: 'tank' | 'land-area' | 'pool'
    boundary?: string | null
  } = {},
): Promise<BuiltEnclosure> {
  const id = api.nextId()
  await api.composition.enclosures.service.enterEnclosure(await context(api), {
    id,
    code,
    name: given.name ?? `Tank ${code}`,
    kind: given.kind ?? 'tank',
    area: given.area ?? 'Test hall',
    boundary: given.boundary ?? null,
    airSpace: null,
    treatmentVessel: false,
    fillMark: null,
    description: null,
    inUseFrom: longAgo,
  })
  const built = await api.composition.enclosures.questions.byId(id)
  return { id, code, waterBodyId: built?.waterBodyId ?? '' }
}

/** A sump or loop. */
export async function aWaterBody(
  api: TestApi,
  code: string,
  kind: 'sump' | 'loop' = 'sump',
): Promise<string> {
  const id = api.nextId()
  await api.composition.enclosures.service.enterWaterBody(await context(api), {
    id,
    code,
    name: `Sump ${code}`,
    kind,
    inUseFrom: longAgo,
  })
  return id
}

/** A valve between two bodies, open from the start unless told. */
export async function aValve(
  api: TestApi,
  code: string,
  [fromBodyId, toBodyId]: readonly [string, string],
  open = true,
): Promise<string> {
  const id = api.nextId()
  await api.composition.water.services.map.enterConnection(await context(api), {
    id,
    code,
    name: `Valve ${code}`,
    kind: 'valve',
    fromBodyId,
    toBodyId,
    open,
    inUseFrom: longAgo,
  })
  return id
}

/** A sheet for a rectangular tank of 2.40 × 1.20 × 0.68 m with a sump of 1.10 × 0.60 × 0.40 m: 2,222.4 L gross. */
export const aTankAndSumpSheet = {
  method: 'geometry' as const,
  parts: [
    {
      key: 'tank',
      role: 'tank' as const,
      name: 'QT-3',
      shape: {
        shape: 'rectangular' as const,
        length: { value: '2.40', unit: 'm' },
        width: { value: '1.20', unit: 'm' },
        depth: { value: '0.68', unit: 'm' },
      },
      errorPercent: 2,
    },
    {
      key: 'sump',
      role: 'sump' as const,
      shape: {
        shape: 'rectangular' as const,
        length: { value: '1.10', unit: 'm' },
        width: { value: '0.60', unit: 'm' },
        depth: { value: '0.40', unit: 'm' },
      },
      errorPercent: 2,
    },
  ],
  pipes: [],
  displacement: { by: 'volume' as const, volume: { value: '41.0', unit: 'L' }, errorPercent: 5 },
}
