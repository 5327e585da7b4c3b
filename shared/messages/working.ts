import type { WorkingCode } from '../domain/working/working-code.ts'
import { defineMessages } from './define-messages.ts'

type Params = Readonly<Record<string, string | number>>

/** Roles of the parts of a volume, where a part has no name of its own. */
const roles = defineMessages({
  tank: 'Tank',
  sump: 'Sump',
  vessel: 'Vessel',
  pipe: 'Pipes',
  net: 'Net volume',
})

/** The name of a part, "QT-3", or the word for its role. */
function part(p: Params): string {
  if (typeof p.name === 'string' && p.name !== '') return p.name
  return typeof p.role === 'string' && p.role in roles ? roles[p.role as keyof typeof roles] : roles.tank
}

/** What a line of working works out, at the left of the line. Parameters are those of the line. */
export const workingLabels = defineMessages({
  'water-rectangular': (p) => part(p),
  'water-cylindrical': (p) => part(p),
  'water-half-cylindrical': (p) => `${part(p)}, half cylinder`,
  'water-cone-bottom': (p) => `${part(p)}, cylinder on a cone`,
  'water-in-cone': (p) => `${part(p)}, water within the cone`,
  'water-elliptical': (p) => `${part(p)}, ellipse`,
  'water-polygon': (p) => `${part(p)}, polygon`,
  'water-truncated-cone': (p) => `${part(p)}, sloping sides`,
  'water-spherical-cap': (p) => `${part(p)}, dished floor`,
  'bow-radius': (p) => `${part(p)}, radius of the bow`,
  'bow-segment': (p) => `${part(p)}, area of the bow`,
  'water-bow-front': (p) => `${part(p)}, with bow front`,
  'segment-area': (p) => `${part(p)}, area under water`,
  'water-horizontal-cylinder': (p) => `${part(p)}, lying cylinder`,
  'water-pipe': (p) => part(p),
  'water-stated': (p) => `${part(p)}, as stated`,
  'water-metered': () => 'Net volume by meter',
  'water-salt-dilution': () => 'Net volume by salt dilution',
  'gross-volume': () => 'Gross volume',
  'displaced-stated': () => 'Displaced, measured',
  'displaced-share': () => 'Displaced, guessed share',
  'net-volume': () => 'Net volume, unrounded',
  'volume-error': () => 'Error of the volume',
  'volume-error-percent': () => 'Error, relative',
  'turnover-time': () => 'Turnover time',
  'turnovers-per-day': () => 'Turnovers',
  'flow-for-turnover': () => 'Flow needed',
  'change-fraction': () => 'Share of the water changed',
  'net-volume-used': () => 'Net volume used',
  'changed-volume-used': () => 'Water replaced',
  'stock-volume-used': () => 'Volume of the stock',
  'kept-share': () => 'Share still there',
  'left-after-change': () => 'Left after the change',
  'reading-as-compound': () => 'What was found, as the compound',
  'rise-needed': () => 'Rise needed',
  'active-needed': () => 'Active substance needed',
  'drug-for-weight': () => 'Drug for this weight',
  'active-in-amount': () => 'Drug in the amount',
  'dose-by-amount': () => 'Dose that the amount comes to',
  'strength-from-w-v': () => 'Strength from % w/v',
  'strength-from-w-w': () => 'Strength from % w/w and density',
  'strength-stated': () => 'Strength as labelled',
  'active-share': () => 'Share of active substance',
  'product-mass': () => 'Product',
  'product-at-purity': () => 'Product at its purity',
  'product-volume': () => 'Product',
  'product-volume-from-active': () => 'Product at its strength',
  'product-volume-from-mass': () => 'Product by its density',
  'flow-volume': () => 'Water that flows through',
  'concentration-reached': () => 'Concentration reached',
} satisfies Record<WorkingCode, (p: Params) => string>)
