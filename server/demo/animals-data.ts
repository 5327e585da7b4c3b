import type { AnimalForm, LifeStage, Sex } from '../../shared/domain/animals/description.ts'
import type { CountKind } from '../../shared/domain/ledger/count-entry.ts'

/** One accession of the practice scenario. All names and marks are invented; marks begin with the test prefix 999. */
export interface DemoAnimal {
  /** Batch of a shipment, or the place; the seeds that follow find animals by it. */
  batch: string
  scientificName: string
  form: AnimalForm
  count: number
  estimate?: { low: number; high: number }
  enclosure: string
  /** Days before the day of loading. */
  arrivedDaysAgo: number
  kind: CountKind
  name?: string
  sex?: Sex
  stage?: LifeStage
  /** Digits after the test prefix of a transponder, or a ring. */
  transponder?: string
  ring?: string
  /** Mass of one animal at the start of the history and the change of it over 90 days, with how often it is weighed. */
  weight?: { kg: number; changePercent: number; everyDays: number; unit: 'g' | 'kg'; places: number }
}

type Weighing = NonNullable<DemoAnimal['weight']>
const weighed = (
  kg: number,
  changePercent: number,
  everyDays: number,
  unit: 'g' | 'kg' = 'kg',
  places = 1,
): Weighing => ({ kg, changePercent, everyDays, unit, places })

type More = Partial<
  Pick<DemoAnimal, 'name' | 'sex' | 'stage' | 'transponder' | 'ring' | 'weight' | 'estimate' | 'kind'>
>

const one = (
  batch: string,
  scientificName: string,
  enclosure: string,
  arrivedDaysAgo: number,
  more: More = {},
): DemoAnimal => ({
  batch,
  scientificName,
  form: 'individual',
  count: 1,
  enclosure,
  arrivedDaysAgo,
  kind: 'transfer-in',
  ...more,
})

const school = (
  batch: string,
  scientificName: string,
  enclosure: string,
  arrivedDaysAgo: number,
  count: number,
  more: More = {},
): DemoAnimal => ({
  batch,
  scientificName,
  form: 'group',
  count,
  enclosure,
  arrivedDaysAgo,
  kind: 'transfer-in',
  ...more,
})

const collected = { kind: 'wild-collection' } as const

export const demoAnimals: readonly DemoAnimal[] = [
  // kelp hall
  school('kelp-hall', 'Tautogolabrus adspersus', 'KH-1', 1460, 85, {
    ...collected,
    estimate: { low: 75, high: 95 },
    weight: weighed(0.182, 4, 30, 'g', 0),
  }),
  school('kelp-hall', 'Gadus morhua', 'KH-1', 1100, 9, { ...collected, weight: weighed(4.6, 5, 30) }),
  one('kelp-hall', 'Anarhichas lupus', 'KH-1', 1980, {
    name: 'Old Toll',
    sex: 'male',
    transponder: '000 000 101 014',
    weight: weighed(9.4, 1, 30),
  }),
  one('kelp-hall', 'Anarhichas lupus', 'KH-1', 1980, {
    name: 'Barnacle',
    sex: 'female',
    transponder: '000 000 101 022',
    weight: weighed(7.8, 2, 30),
  }),
  one('kelp-hall', 'Hemitripterus americanus', 'KH-1', 640, {
    ...collected,
    name: 'Rust',
    weight: weighed(1.35, 3, 30, 'kg', 2),
  }),
  one('kelp-hall', 'Hemitripterus americanus', 'KH-1', 640, {
    ...collected,
    name: 'Ember',
    weight: weighed(1.12, 4, 30, 'kg', 2),
  }),
  ...(['Pudding', 'Button', 'Clementine', 'Moss'] as const).map((name, i) =>
    one('kelp-hall', 'Cyclopterus lumpus', 'KH-1', 410 + i, {
      ...collected,
      name,
      stage: 'adult',
      weight: weighed(0.9 + i * 0.12, 6, 14, 'kg', 2),
    }),
  ),
  school('kelp-hall', 'Strongylocentrotus droebachiensis', 'KH-1', 1460, 60, {
    ...collected,
    estimate: { low: 50, high: 80 },
  }),
  school('kelp-hall', 'Asterias rubens', 'KH-1', 1460, 24, collected),
  ...(['Duke', 'Captain', 'Mary Anne'] as const).map((name, i) =>
    one('kelp-hall', 'Homarus americanus', 'KH-1', 820 + 40 * i, {
      ...collected,
      name,
      sex: i === 2 ? 'female' : 'male',
      weight: weighed(1.9 + i * 0.8, 1, 30, 'kg', 2),
    }),
  ),
  school('tide-table', 'Pagurus acadianus', 'KH-2', 300, 30, collected),
  school('tide-table', 'Littorina littorea', 'KH-2', 300, 200, {
    ...collected,
    estimate: { low: 150, high: 250 },
  }),
  school('tide-table', 'Limulus polyphemus', 'KH-2', 520, 5, {
    ...collected,
    weight: weighed(1.9, 1, 30, 'kg', 2),
  }),
  one('octopus', 'Enteroctopus dofleini', 'OC-1', 210, {
    ...collected,
    name: 'Marl',
    sex: 'female',
    weight: weighed(11.8, 22, 7),
  }),

  // river gallery
  school('river', 'Salvelinus fontinalis', 'RG-1', 560, 40, { weight: weighed(0.42, 9, 30, 'g', 0) }),
  school('river', 'Oncorhynchus mykiss', 'RG-1', 560, 25, { weight: weighed(1.28, 7, 30, 'kg', 2) }),
  ...(['Slate', 'Grist', 'Weir', 'Tarn', 'Fathom'] as const).map((name, i) =>
    one('river', 'Acipenser fulvescens', 'RG-2', 2600 - 3 * i, {
      name,
      transponder: `000 000 202 0${String(11 + i)}`,
      weight: weighed(18.4 + i * 3.7, 3, 30),
    }),
  ),

  // jelly room
  school('jellies', 'Aurelia aurita', 'JR-1', 130, 220, {
    kind: 'propagation',
    estimate: { low: 180, high: 260 },
    weight: weighed(0.061, 12, 30, 'g', 0),
  }),
  school('jellies', 'Chrysaora quinquecirrha', 'JR-2', 130, 60, {
    kind: 'propagation',
    estimate: { low: 50, high: 70 },
  }),

  // ray pool
  ...(['Sail', 'Penny', 'Drift', 'Veil'] as const).map((name, i) =>
    one('ray-pool', 'Hypanus americanus', 'RP-1', 1350 - 20 * i, {
      name,
      sex: i === 1 ? 'male' : 'female',
      transponder: `000 000 303 0${String(41 + i)}`,
      weight: weighed(43.8 - i * 6.1, i === 0 ? -5 : 3, 14),
    }),
  ),
  ...(['Ace', 'Brim', 'Cleat', 'Dory', 'Eddy'] as const).map((name, i) =>
    one('ray-pool', 'Rhinoptera bonasus', 'RP-1', 900, {
      name,
      sex: i % 2 ? 'male' : 'female',
      transponder: `000 000 304 0${String(11 + i)}`,
      weight: weighed(12.6 + i * 1.1, 4, 30),
    }),
  ),
  ...(['Stripe', 'Twill', 'Tweed'] as const).map((name, i) =>
    one('ray-pool', 'Chiloscyllium punctatum', 'RP-1', 700, {
      name,
      transponder: `000 000 305 0${String(11 + i)}`,
      weight: weighed(2.6 + i * 0.4, 3, 30, 'kg', 2),
    }),
  ),
  ...(['Mallet', 'Anvil'] as const).map((name, i) =>
    one('ray-pool', 'Sphyrna tiburo', 'RP-1', 480, {
      kind: 'loan-in',
      name,
      transponder: `000 000 306 0${String(11 + i)}`,
      weight: weighed(5.1 + i * 0.6, 3, 30, 'kg', 2),
    }),
  ),

  // shore bird beach
  ...(['Red over white', 'Red over blue', 'Blue over white', 'White over red'] as const).map((ring, i) =>
    one('shore-birds', 'Haematopus palliatus', 'LA-1', 980, {
      ring,
      sex: i % 2 ? 'male' : 'female',
      kind: 'rescue',
      weight: weighed(0.585 + i * 0.012, 1, 14, 'g', 0),
    }),
  ),
  ...(['Green 4', 'Green 5', 'Green 7'] as const).map((ring, i) =>
    one('shore-birds', 'Somateria mollissima', 'LA-1', 620, {
      ring,
      sex: i === 1 ? 'male' : 'female',
      kind: 'rescue',
      weight: weighed(1.92 + i * 0.1, -2, 14, 'g', 0),
    }),
  ),

  // quarantine wing
  school('lumpfish', 'Cyclopterus lumpus', 'QT-6', 66, 6, { ...collected, stage: 'subadult' }),
  school('cod', 'Gadus morhua', 'QT-6', 9, 24, { ...collected, stage: 'subadult' }),
  school('reef', 'Zebrasoma flavescens', 'QT-1', 24, 6, {
    kind: 'purchase',
    weight: weighed(0.094, 6, 10, 'g', 1),
  }),
  school('reef', 'Paracanthurus hepatus', 'QT-1', 24, 4, {
    kind: 'purchase',
    weight: weighed(0.118, 5, 10, 'g', 1),
  }),
  school('reef', 'Amphiprion ocellaris', 'QT-1', 24, 12, {
    kind: 'purchase',
    weight: weighed(0.0124, 4, 10, 'g', 1),
  }),
  ...(['Flare', 'Plume', 'Quill'] as const).map((name, i) =>
    one('reef-addition', 'Pterois volitans', 'QT-1', 12, {
      kind: 'purchase',
      name,
      weight: weighed(0.31 + i * 0.05, 3, 7, 'g', 0),
    }),
  ),
  school('seahorses', 'Hippocampus erectus', 'QT-2', 33, 14, {
    kind: 'transfer-in',
    weight: weighed(0.0112, 5, 7, 'g', 1),
  }),
  ...(['Cape', 'Cowl'] as const).map((name, i) =>
    one('rays', 'Hypanus americanus', 'QT-3', 19, {
      name,
      sex: 'female',
      stage: 'subadult',
      transponder: `000 000 303 0${String(51 + i)}`,
      weight: weighed(14.2 + i * 1.7, -1, 7),
    }),
  ),
  school('sturgeon', 'Acipenser fulvescens', 'QT-4', 21, 18, {
    stage: 'juvenile',
    weight: weighed(0.74, 8, 7, 'g', 0),
  }),
  ...(['Reed', 'Sedge', 'Rush', 'Fern'] as const).map((name, i) =>
    one('amphibians', 'Ambystoma mexicanum', 'QT-5', 38, {
      name,
      sex: i % 2 ? 'male' : 'female',
      weight: weighed(0.142 + i * 0.011, 4, 14, 'g', 0),
    }),
  ),
  school('amphibians', 'Dendrobates tinctorius', 'QT-5', 38, 9, { weight: weighed(0.0043, 3, 14, 'g', 2) }),
]
