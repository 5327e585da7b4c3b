import type { RememberedUnits } from './bench-draft.ts'

const storeKey = 'pratique.bench-units'

/** The units that were used last on this device. A device that keeps nothing is no hindrance. */
export function rememberedUnits(): RememberedUnits {
  try {
    const kept: unknown = JSON.parse(localStorage.getItem(storeKey) ?? '{}')
    return typeof kept === 'object' && kept !== null ? (kept as RememberedUnits) : {}
  } catch {
    return {}
  }
}

/** Remembers the unit of one input. */
export function rememberUnit(key: string, unit: string): void {
  try {
    // every key that is typed comes by here
    if (rememberedUnits()[key] === unit) return
    localStorage.setItem(storeKey, JSON.stringify({ ...rememberedUnits(), [key]: unit }))
  } catch {
    // a full or shut store: the unit is asked for again next time
  }
}
