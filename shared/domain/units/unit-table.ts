/**
 * The one table of units. No factor of conversion stands anywhere else in the project.
 *
 * A unit is named by an ASCII code ("mg/L", "uL/L", "degC"): the code goes over the wire, into the database and into
 * logs, where "µ" and "°" get lost. What people read is `symbol`; the words are in shared/messages/units.ts.
 *
 * Factors are fractions of whole numbers, so that 2500 mg is 2500 × 1 ÷ 1000 g and not 2500 × 0.001 g:
 * the canonical value is (value + offset) × numerator ÷ denominator.
 *
 * @source nist-sp-811 (exact definitions of inch, pound, gallon) · alkalinity: iupac-weights
 */
export type Dimension =
  | 'volume'
  | 'length'
  | 'area'
  | 'mass'
  | 'temperature'
  | 'temperatureDifference'
  | 'massConcentration'
  | 'volumeConcentration'
  | 'massFraction'
  | 'bodyDose'
  | 'density'
  | 'time'
  | 'flow'
  | 'rate'
  | 'practicalSalinity'
  | 'absoluteSalinity'
  | 'ph'
  | 'specificGravity'
  | 'conductivity'
  | 'pressure'
  | 'alkalinity'
  | 'potential'
  | 'percentage'
  | 'activity'
  | 'pureNumber'
  | 'massFlow'
  | 'exposure'

export interface Unit<D extends Dimension = Dimension> {
  dimension: D
  /** What stands on screen and paper after the number. Micrograms and microlitres are spelled (safe writing). */
  symbol: string
  /** The symbol after exactly 1, where the word changes ("1 microgram"). */
  symbolOfOne?: string
  numerator: number
  denominator: number
  /** Added to the value before the fraction: only temperatures have one. */
  offset: number
  /** Decimal places that a computed value is usually shown with; a reading keeps its own. */
  places: number
  /** Scales such as pH are named before the number. */
  symbolFirst?: true
}

type More = Partial<Pick<Unit, 'symbolOfOne' | 'offset' | 'symbolFirst'>>

const row = <D extends Dimension>(
  dimension: D,
  symbol: string,
  [numerator, denominator]: readonly [number, number],
  places: number,
  more: More = {},
): Unit<D> => ({ dimension, symbol, numerator, denominator, places, offset: 0, ...more })

export const unitTable = {
  // volume, canonical L
  uL: row('volume', 'microlitres', [1, 1_000_000], 0, { symbolOfOne: 'microlitre' }),
  mL: row('volume', 'mL', [1, 1000], 1),
  L: row('volume', 'L', [1, 1], 1),
  m3: row('volume', 'm³', [1000, 1], 3),
  gal_us: row('volume', 'US gal', [3_785_411_784, 1_000_000_000], 1),
  gal_imp: row('volume', 'imperial gal', [454_609, 100_000], 1),
  floz_us: row('volume', 'US fl oz', [295_735_295_625, 10_000_000_000_000], 2),
  tsp_us: row('volume', 'US teaspoons', [492_892_159_375, 100_000_000_000_000], 2, {
    symbolOfOne: 'US teaspoon',
  }),
  tbsp_us: row('volume', 'US tablespoons', [1_478_676_478_125, 100_000_000_000_000], 2, {
    symbolOfOne: 'US tablespoon',
  }),
  in3: row('volume', 'in³', [16_387_064, 1_000_000_000], 0),
  ft3: row('volume', 'ft³', [28_316_846_592, 1_000_000_000], 2),
  /** 43,560 cubic feet of the international foot; the survey acre-foot is 6 in a million larger. */
  acre_ft: row('volume', 'acre-ft', [123_348_183_754_752, 100_000_000], 4),

  // length, canonical m
  mm: row('length', 'mm', [1, 1000], 0),
  cm: row('length', 'cm', [1, 100], 1),
  m: row('length', 'm', [1, 1], 2),
  in: row('length', 'in', [254, 10_000], 1),
  ft: row('length', 'ft', [3048, 10_000], 2),

  // area, canonical m²
  m2: row('area', 'm²', [1, 1], 3),

  // mass, canonical g
  ug: row('mass', 'micrograms', [1, 1_000_000], 0, { symbolOfOne: 'microgram' }),
  mg: row('mass', 'mg', [1, 1000], 1),
  g: row('mass', 'g', [1, 1], 2),
  kg: row('mass', 'kg', [1000, 1], 3),
  t: row('mass', 't', [1_000_000, 1], 3),
  lb: row('mass', 'lb', [45_359_237, 100_000], 2),
  oz_av: row('mass', 'oz', [28_349_523_125, 1_000_000_000], 2),

  // temperature (ITS-90), canonical °C
  degC: row('temperature', '°C', [1, 1], 1),
  degF: row('temperature', '°F', [5, 9], 1, { offset: -32 }),
  K: row('temperature', 'K', [1, 1], 2, { offset: -273.15 }),
  // a difference of temperatures has no offset
  delta_degC: row('temperatureDifference', '°C', [1, 1], 1),
  delta_degF: row('temperatureDifference', '°F', [5, 9], 1),

  // mass of something in a volume of water, canonical mg/L; of what, says the basis (basis.ts)
  'ug/L': row('massConcentration', 'micrograms/L', [1, 1000], 0, { symbolOfOne: 'microgram/L' }),
  'mg/L': row('massConcentration', 'mg/L', [1, 1], 2),
  'g/m3': row('massConcentration', 'g/m³', [1, 1], 2),
  'g/L': row('massConcentration', 'g/L', [1000, 1], 2),
  'mg/mL': row('massConcentration', 'mg/mL', [1000, 1], 1),
  'g/mL_w_v': row('massConcentration', 'g/mL', [1_000_000, 1], 4),
  percent_w_v: row('massConcentration', '% w/v', [10_000, 1], 1),

  // volume of product in a volume of water, canonical µL/L
  'uL/L': row('volumeConcentration', 'µL/L', [1, 1], 1),
  'mL/m3': row('volumeConcentration', 'mL/m³', [1, 1], 1),
  'mL/L': row('volumeConcentration', 'mL/L', [1000, 1], 3),
  percent_v_v: row('volumeConcentration', '% v/v', [10_000, 1], 1),

  // mass in a mass of product, canonical % w/w
  percent_w_w: row('massFraction', '% w/w', [1, 1], 2),
  'mg/kg_w_w': row('massFraction', 'mg/kg w/w', [1, 10_000], 0),
  'g/kg_w_w': row('massFraction', 'g/kg w/w', [1, 10], 1),
  'mg/g_w_w': row('massFraction', 'mg/g w/w', [1, 10], 1),
  /** Of 2,000 lb, as feed levels are printed in the United States: 907.18474 kg. */
  'g/ton_us': row('massFraction', 'g per US short ton', [10_000, 90_718_474], 0),

  // drug per body mass, canonical mg/kg
  'ug/kg': row('bodyDose', 'micrograms/kg', [1, 1000], 0, { symbolOfOne: 'microgram/kg' }),
  'mg/kg': row('bodyDose', 'mg/kg', [1, 1], 2),

  // density, canonical g/mL
  'g/mL': row('density', 'g/mL', [1, 1], 3),
  'kg/L': row('density', 'kg/L', [1, 1], 3),
  'kg/m3': row('density', 'kg/m³', [1, 1000], 1),

  // time, canonical min
  s: row('time', 's', [1, 60], 0),
  min: row('time', 'min', [1, 1], 0),
  h: row('time', 'h', [60, 1], 1),
  d: row('time', 'days', [1440, 1], 1, { symbolOfOne: 'day' }),
  week: row('time', 'weeks', [10_080, 1], 1, { symbolOfOne: 'week' }),

  // flow of water, canonical L/min
  'mL/min': row('flow', 'mL/min', [1, 1000], 1),
  'L/min': row('flow', 'L/min', [1, 1], 1),
  'L/h': row('flow', 'L/h', [1, 60], 0),
  'm3/h': row('flow', 'm³/h', [1000, 60], 2),
  'gal_us/min': row('flow', 'US gal/min', [3_785_411_784, 1_000_000_000], 1),

  // how often, canonical per min
  per_min: row('rate', 'per min', [1, 1], 0),
  per_h: row('rate', 'per h', [1, 60], 1),
  per_d: row('rate', 'per day', [1, 1440], 2),

  // two scales of salinity that no factor joins
  'PSS-78': row('practicalSalinity', 'PSS-78', [1, 1], 1),
  'g/kg': row('absoluteSalinity', 'g/kg', [1, 1], 1),

  /** NBS scale, as hobby and laboratory electrodes are calibrated. */
  pH: row('ph', 'pH', [1, 1], 2, { symbolFirst: true }),
  /** Relative to pure water; water and reference temperature are stated beside it. */
  SG: row('specificGravity', 'SG', [1, 1], 4, { symbolFirst: true }),

  // conductivity, canonical mS/cm
  'uS/cm': row('conductivity', 'µS/cm', [1, 1000], 0),
  'mS/cm': row('conductivity', 'mS/cm', [1, 1], 2),
  'S/m': row('conductivity', 'S/m', [10, 1], 3),

  // pressure, canonical kPa
  kPa: row('pressure', 'kPa', [1, 1], 1),
  hPa: row('pressure', 'hPa', [1, 10], 0),
  bar: row('pressure', 'bar', [100, 1], 3),
  atm: row('pressure', 'atm', [101_325, 1000], 3),
  /** Conventional: 133.322387415 Pa. */
  mmHg: row('pressure', 'mmHg', [133_322_387_415, 1_000_000_000_000], 0),
  /** Conventional inch of mercury: 3386.388640341 Pa. */
  inHg: row('pressure', 'inHg', [3_386_388_640_341, 1_000_000_000_000], 2),
  /** Pound-force per square inch: 0.45359237 kg × 9.80665 m/s² ÷ (0.0254 m)². */
  psi: row('pressure', 'psi', [8_896_443_230_521, 1_290_320_000_000], 1),

  // alkalinity, canonical meq/L; 100.086 and 56.077 g/mol are calcium carbonate and calcium oxide
  'meq/L': row('alkalinity', 'meq/L', [1, 1], 2),
  'mg/L_CaCO3': row('alkalinity', 'mg/L as CaCO3', [2000, 100_086], 0),
  dKH: row('alkalinity', 'dKH', [20_000, 56_077], 1),

  mV: row('potential', 'mV', [1, 1], 0),
  percent: row('percentage', '%', [1, 1], 1),
  /** What has no unit by its nature: a ratio of two like quantities, a condition factor. Its name stands before it. */
  ratio: row('pureNumber', '', [1, 1], 4),

  // mass that passes in a time, canonical g/h
  'mg/h': row('massFlow', 'mg/h', [1, 1000], 1),
  'g/h': row('massFlow', 'g/h', [1, 1], 2),

  /** Residual oxidant times the time it acts. */
  'mg_min/L': row('exposure', 'mg·min/L', [1, 1], 2),

  /** Units of activity of a drug; never "U" or "IU". */
  units: row('activity', 'units', [1, 1], 0, { symbolOfOne: 'unit' }),
} as const satisfies Record<string, Unit>

export type UnitCode = keyof typeof unitTable

/** The units of one dimension: `UnitOf<'length'>` is `'mm' | 'cm' | 'm' | 'in' | 'ft'`. */
export type UnitOf<D extends Dimension> = {
  [Code in UnitCode]: (typeof unitTable)[Code]['dimension'] extends D ? Code : never
}[UnitCode]

/** The unit that each dimension is computed and stored in. */
export const canonicalUnit = {
  volume: 'L',
  length: 'm',
  area: 'm2',
  mass: 'g',
  temperature: 'degC',
  temperatureDifference: 'delta_degC',
  massConcentration: 'mg/L',
  volumeConcentration: 'uL/L',
  massFraction: 'percent_w_w',
  bodyDose: 'mg/kg',
  density: 'g/mL',
  time: 'min',
  flow: 'L/min',
  rate: 'per_min',
  practicalSalinity: 'PSS-78',
  absoluteSalinity: 'g/kg',
  ph: 'pH',
  specificGravity: 'SG',
  conductivity: 'mS/cm',
  pressure: 'kPa',
  alkalinity: 'meq/L',
  potential: 'mV',
  pureNumber: 'ratio',
  massFlow: 'g/h',
  exposure: 'mg_min/L',
  percentage: 'percent',
  activity: 'units',
} as const satisfies { [D in Dimension]: UnitOf<D> }
