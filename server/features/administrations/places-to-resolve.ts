import type { BathSheet } from '../../../shared/contracts/doses.contract.ts'
import type { ResolveCode } from '../../../shared/domain/cautions/caution-code.ts'

/** Where in the application somebody resolves what a caution asks for; the rest is done at the tank or by the vet. */
export const placesToResolve: Partial<Record<ResolveCode, BathSheet['steps'][number]['place']>> = {
  'read-oxygen': 'readings',
  'raise-oxygen': 'readings',
  'aerate-and-log': 'water',
  'read-temperature': 'readings',
  'cool-water': 'readings',
  'warm-water': 'readings',
  'read-alkalinity': 'readings',
  'raise-alkalinity': 'readings',
  'read-copper': 'readings',
  'read-water': 'readings',
  'correct-water': 'readings',
  'test-nitrogen': 'readings',
  'biofilter-off': 'water',
  'part-the-water': 'water',
  'move-animals': 'water',
  'record-inhabitants': 'water',
  'look-at-animals': 'animals',
  'carbon-off': 'water',
  'ozone-off': 'water',
  'uv-off': 'water',
  'fractionator-off': 'water',
  'determine-volume': 'volume',
  'look-at-the-bottle': 'lot',
  'use-other-lot': 'lot',
  'record-lot': 'lot',
  'calculate-again-by-another': 'second-calculation',
}
