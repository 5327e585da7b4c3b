import ammonia from './cases/ammonia.json' with { type: 'json' }
import anaestheticStock from './cases/anaesthetic-stock.json' with { type: 'json' }
import bathDose from './cases/bath-dose.json' with { type: 'json' }
import copper from './cases/copper.json' with { type: 'json' }
import dechlorination from './cases/dechlorination.json' with { type: 'json' }
import flowAndChange from './cases/flow-and-change.json' with { type: 'json' }
import injectionAndFeed from './cases/injection-and-feed.json' with { type: 'json' }
import labelsAndOrders from './cases/labels-and-orders.json' with { type: 'json' }
import lengthAndWeight from './cases/length-and-weight.json' with { type: 'json' }
import lifeSupport from './cases/life-support.json' with { type: 'json' }
import oxygen from './cases/oxygen.json' with { type: 'json' }
import salinityAndDensity from './cases/salinity-and-density.json' with { type: 'json' }
import salinityChange from './cases/salinity-change.json' with { type: 'json' }
import tankGeometry from './cases/tank-geometry.json' with { type: 'json' }
import units from './cases/units.json' with { type: 'json' }
import { publishedCases, type PublishedCase, type Runner } from './published-case.ts'
import { ammoniaRunners } from './runners/ammonia-runners.ts'
import { anaesthesiaRunners } from './runners/anaesthesia-runners.ts'
import { copperRunners } from './runners/copper-runners.ts'
import { disinfectionRunners } from './runners/disinfection-runners.ts'
import { growthRunners } from './runners/growth-runners.ts'
import { injectionFeedRunners } from './runners/injection-feed-runners.ts'
import { neutralisationRunners } from './runners/neutralisation-runners.ts'
import { doseRunners } from './runners/dose-runners.ts'
import { gasRunners } from './runners/gas-runners.ts'
import { seawaterRunners } from './runners/seawater-runners.ts'
import { flowRunners } from './runners/flow-runners.ts'
import { unitsRunners } from './runners/units-runners.ts'
import { waterRunners } from './runners/water-runners.ts'

/** Every group of published values. A new group is a file in cases/ and a line here. */
export const groups: Readonly<Record<string, readonly PublishedCase[]>> = {
  'salinity and density': publishedCases.parse(salinityAndDensity),
  oxygen: publishedCases.parse(oxygen),
  ammonia: publishedCases.parse(ammonia),
  'bath dose': publishedCases.parse(bathDose),
  'tank geometry': publishedCases.parse(tankGeometry),
  'flow and change': publishedCases.parse(flowAndChange),
  'salinity change': publishedCases.parse(salinityChange),
  copper: publishedCases.parse(copper),
  'injection and feed': publishedCases.parse(injectionAndFeed),
  'length and weight': publishedCases.parse(lengthAndWeight),
  dechlorination: publishedCases.parse(dechlorination),
  'anaesthetic stock': publishedCases.parse(anaestheticStock),
  'life support': publishedCases.parse(lifeSupport),
  units: publishedCases.parse(units),
  'labels and orders': publishedCases.parse(labelsAndOrders),
}

/** Who computes which calculator. A new engine adds its map of runners here. */
const runnerMaps: readonly Readonly<Record<string, Runner>>[] = [
  ammoniaRunners,
  flowRunners,
  unitsRunners,
  waterRunners,
  doseRunners,
  gasRunners,
  seawaterRunners,
  anaesthesiaRunners,
  copperRunners,
  disinfectionRunners,
  growthRunners,
  injectionFeedRunners,
  neutralisationRunners,
]

export const runners: ReadonlyMap<string, Runner> = new Map(runnerMaps.flatMap((map) => Object.entries(map)))

/** A calculator that two maps claim is a fault: the later one would hide the earlier. */
export const runnerNames: readonly string[] = runnerMaps.flatMap((map) => Object.keys(map))
