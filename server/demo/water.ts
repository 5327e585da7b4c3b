import type { VolumeSheet } from '../../shared/domain/water/volume-sheet.ts'
import type { Composition } from '../composition.ts'
import type { settableClock } from '../platform/clock.ts'
import type { RequestContext } from '../platform/http/request-context.ts'
import { dayMs, demoTimes, historyDays } from './demo-time.ts'
import type { DemoActors, DemoPerson } from './people.ts'
import { demoLand, demoWaters } from './water-places.ts'
import type { DemoEnclosure, DemoWater } from './water-places.ts'
import { measuredIn, wanderingReadings } from './water-readings.ts'
import type { DemoReading } from './water-readings.ts'

/** Places were in use long before the history that is shown. */
const inUseDays = 900

export interface DemoOutside {
  clock: ReturnType<typeof settableClock>
  /** The moment of loading: the end of the history. */
  now: Date
  people: DemoActors
}

/** Ids of what the water seed made, by code, for the seeds that follow. */
export interface DemoWaterIds {
  enclosureIds: Map<string, string>
  waterBodyIds: Map<string, string>
  connectionIds: Map<string, string>
  machineIds: Map<string, string>
}

/** How one water of the demo is measured: its tanks and sump with what stands in them, and its pipes. */
function sheetOf(water: DemoWater): VolumeSheet | null {
  const tanks = water.enclosures.filter((one) => one.shape)
  const [only] = water.enclosures
  if (only?.shape?.shape === 'stated')
    return {
      method: 'metered',
      startReading: { value: '0', unit: 'L' },
      endReading: only.shape.volume,
      errorPercent: 1,
    }
  if (tanks.length === 0) return null
  const displaced = water.enclosures.reduce((sum, one) => sum + Number(one.displacedLitres ?? 0), 0)
  const parts = tanks.flatMap((one) =>
    one.shape
      ? [
          {
            key: one.code.toLowerCase(),
            role: 'tank' as const,
            name: one.code,
            shape: one.shape,
            errorPercent: 2,
          },
        ]
      : [],
  )
  const { sump, pipe } = water
  return {
    method: 'geometry',
    parts: [
      ...parts,
      ...(sump
        ? [
            {
              key: sump.code.toLowerCase(),
              role: 'sump' as const,
              name: sump.code,
              shape: sump.shape,
              errorPercent: 2,
            },
          ]
        : []),
    ],
    pipes: pipe
      ? [
          {
            key: 'pipes',
            bore: { value: pipe.bore, unit: 'mm' },
            length: { value: pipe.length, unit: 'm' },
            errorPercent: 10,
          },
        ]
      : [],
    ...(displaced > 0
      ? {
          displacement: {
            by: 'volume' as const,
            volume: { value: String(displaced), unit: 'L' as const },
            errorPercent: 10,
          },
        }
      : {}),
  }
}

/**
 * Enters the water of the invented Harrow Point Sea Hall through the services: enclosures, sumps, valves, machines,
 * ranges, volumes (measured by one technician, confirmed by the other), 90 days of readings, and what was done to
 * the water. Walks the clock from 90 days before `now` to `now`.
 */
export async function seedWater(composition: Composition, outside: DemoOutside): Promise<DemoWaterIds> {
  const { clock, now, people } = outside
  const { enclosures, water, parts, facility } = composition
  const { at: localTime, dateOf } = demoTimes(now, await facility.service.zone())
  const as = (who: DemoPerson): RequestContext => ({ actor: people[who], requestId: 'demo' })
  const start = new Date(now.getTime() - historyDays * dayMs)
  const inUseFrom = new Date(now.getTime() - inUseDays * dayMs).toISOString()
  const ids: DemoWaterIds = {
    enclosureIds: new Map(),
    waterBodyIds: new Map(),
    connectionIds: new Map(),
    machineIds: new Map(),
  }
  const bodyId = (code: string) => ids.waterBodyIds.get(code) ?? ''

  async function enterEnclosure(given: DemoEnclosure, of: DemoWater): Promise<void> {
    const id = parts.ids.next()
    const { treatmentVessel: vessel } = given
    await enclosures.service.enterEnclosure(as('tech'), {
      id,
      code: given.code,
      name: given.name,
      kind: given.kind,
      area: of.area,
      boundary: of.boundary,
      airSpace: of.airSpace,
      treatmentVessel: vessel !== undefined,
      fillMark: vessel ? { mark: vessel.mark, volume: { value: vessel.litres, unit: 'L' } } : null,
      description: given.description,
      inUseFrom,
    })
    ids.enclosureIds.set(given.code, id)
    const body = await enclosures.questions.byId(id)
    if (body?.waterBodyId) ids.waterBodyIds.set(given.code, body.waterBodyId)
  }

  async function enterWater(of: DemoWater): Promise<void> {
    for (const enclosure of of.enclosures) await enterEnclosure(enclosure, of)
    const { sump } = of
    if (sump) {
      const id = parts.ids.next()
      await enclosures.service.enterWaterBody(as('tech'), {
        id,
        code: sump.code,
        name: sump.name,
        kind: 'sump',
        inUseFrom,
      })
      ids.waterBodyIds.set(sump.code, id)
      for (const { code } of of.enclosures)
        await enterValve(`V-${code}`, `Return of ${code}`, code, sump.code, true)
    }
    const on = sump?.code ?? of.enclosures[0]?.code ?? ''
    for (const machine of of.machines) {
      const id = parts.ids.next()
      await water.services.map.enterLifeSupport(as('tech'), {
        id,
        ...machine,
        waterBodyId: bodyId(on),
        on: true,
        inUseFrom,
      })
      ids.machineIds.set(machine.code, id)
    }
  }

  async function enterValve(
    code: string,
    name: string,
    from: string,
    to: string,
    open: boolean,
  ): Promise<void> {
    const id = parts.ids.next()
    await water.services.map.enterConnection(as('tech'), {
      id,
      code,
      name,
      kind: 'valve',
      fromBodyId: bodyId(from),
      toBodyId: bodyId(to),
      open,
      inUseFrom,
    })
    ids.connectionIds.set(code, id)
  }

  async function setRanges(of: DemoWater): Promise<void> {
    if (!of.climate) return
    for (const { code } of of.enclosures)
      for (const { parameter, unit, range } of measuredIn[of.climate])
        await water.services.measurements.setRange(as('vet'), code, {
          id: parts.ids.next(),
          parameter,
          unit,
          ...range,
        })
  }

  async function measureVolume(of: DemoWater): Promise<void> {
    const sheet = sheetOf(of)
    const [first] = of.enclosures
    if (!sheet || !first || of.volume === 'none') return
    const id = parts.ids.next()
    await water.services.volumes.determineVolume(as('tech'), first.code, {
      id,
      happenedAt: localTime(historyDays + 30, '10:30'),
      waterBodyIds: [
        ...of.enclosures.map((one) => bodyId(one.code)),
        ...(of.sump ? [bodyId(of.sump.code)] : []),
      ],
      sheet: sheet as never,
      nextCheckOn: dateOf(historyDays + 30 - 365),
      note: 'Lengths by tape, displacement by bucket.',
    })
    if (of.volume === 'confirmed') await water.services.volumes.confirmVolume(as('tech2'), id, {})
  }

  const record = (
    who: DemoPerson,
    code: string,
    happenedAt: string,
    readings: DemoReading[],
    instrument: string,
  ) =>
    water.services.measurements.recordReadings(as(who), {
      waterBodyId: bodyId(code),
      happenedAt,
      readings: readings.map((reading) => ({ id: parts.ids.next(), ...reading, instrument })),
    })

  clock.set(start)
  const landId = parts.ids.next()
  ids.enclosureIds.set(demoLand.code, landId)
  await enclosures.service.enterEnclosure(as('tech'), {
    id: landId,
    ...demoLand,
    kind: 'land-area',
    boundary: null,
    airSpace: 'River gallery air',
    treatmentVessel: false,
    fillMark: null,
    inUseFrom,
  })
  for (const one of demoWaters) await enterWater(one)
  // A cross-connection that stays shut: opened, it would make one water of two quarantine systems
  await enterValve('V-X34', 'Cross-connection QS-3 to QS-4', 'QS-3', 'QS-4', false)
  for (const one of demoWaters) {
    await setRanges(one)
    await measureVolume(one)
  }

  const wandering = new Map(
    demoWaters.flatMap((of) =>
      of.enclosures.flatMap(({ code }) =>
        of.climate ? [[code, wanderingReadings(code, of.climate)] as const] : [],
      ),
    ),
  )
  for (let day = 0; day <= historyDays; day++) {
    const daysAgo = historyDays - day
    const round = demoWaters.flatMap((of, index) =>
      day % of.everyDays === 0
        ? of.enclosures.map(({ code }) => ({
            code,
            time: `0${String(8 + (index % 2))}:${String(10 + index)}`,
          }))
        : [],
    )
    for (const { code, time } of round.sort((a, b) => (a.time < b.time ? -1 : 1))) {
      const readings = wandering.get(code)?.(day) ?? []
      if (readings.length === 0) continue
      const happenedAt = localTime(daysAgo, time)
      clock.set(new Date(happenedAt))
      await record(
        day % 3 === 0 ? 'tech' : 'keeper',
        code,
        happenedAt,
        shaped(code, day, readings),
        'Meter 4',
      )
    }
    await dayWork(day, daysAgo)
  }

  /** What was done to the water besides measuring it. */
  async function dayWork(day: number, daysAgo: number): Promise<void> {
    const change = async (code: string, time: string, sharePercent: string) => {
      const happenedAt = localTime(daysAgo, time)
      clock.set(new Date(happenedAt))
      await water.services.measurements.recordWaterEvent(as('keeper'), {
        id: parts.ids.next(),
        waterBodyId: bodyId(code),
        kind: 'water-change',
        sharePercent,
        happenedAt,
      })
    }
    if (day % 14 === 4) await change('QT-1', '13:20', '15')
    if (day % 14 === 9) await change('QT-4', '13:40', '20')
    if (day % 21 === 11) {
      const happenedAt = localTime(daysAgo, '15:05')
      clock.set(new Date(happenedAt))
      await water.services.measurements.recordWaterEvent(as('tech2'), {
        id: parts.ids.next(),
        waterBodyId: bodyId('KS-1'),
        kind: 'backwash',
        amount: { value: '640', unit: 'L' },
        lifeSupportUnitId: ids.machineIds.get('FL-K1') ?? null,
        happenedAt,
      })
    }
    if (daysAgo === 12) await switchOff('AC-1', daysAgo, 'Carbon off for a treatment')
    if (daysAgo === 12) await switchOff('UV-1', daysAgo, 'UV off for a treatment')
    if (daysAgo === 2) await switchOff('FF-6', daysAgo, 'Cleaned, left off over night')
  }

  async function switchOff(code: string, daysAgo: number, note: string): Promise<void> {
    const happenedAt = localTime(daysAgo, '09:40')
    clock.set(new Date(happenedAt))
    await water.services.map.recordLifeSupportState(as('tech'), ids.machineIds.get(code) ?? '', {
      id: parts.ids.next(),
      on: false,
      happenedAt,
      note,
    })
  }

  clock.set(now)
  return ids
}

/** Two stories in the readings: ammonia climbs in the spare system over the last days, and QT-2 once ran warm. */
function shaped(code: string, day: number, readings: DemoReading[]): DemoReading[] {
  const daysAgo = historyDays - day
  return readings.map((reading) => {
    if (code === 'QT-6' && reading.parameter === 'total-ammonia-n' && daysAgo < 16)
      return { ...reading, value: { ...reading.value, value: (0.08 + (16 - daysAgo) * 0.018).toFixed(2) } }
    if (code === 'QT-2' && reading.parameter === 'temperature' && daysAgo >= 40 && daysAgo < 43)
      return { ...reading, value: { ...reading.value, value: (27.4 + (43 - daysAgo) * 0.2).toFixed(1) } }
    return reading
  })
}
