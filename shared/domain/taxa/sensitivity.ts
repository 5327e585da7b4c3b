/** What a taxon may be sensitive to, or known to bear: what the cautions of treatment ask about. */
export const sensitivityCodes = [
  'copper',
  'formalin',
  'hydrogen-peroxide',
  'chloroquine',
  'praziquantel',
  'chloramine-t',
  'permanganate',
  'methylene-blue',
  'salt',
  'fresh-water-dip',
  'low-salinity',
  'anaesthetic',
  'handling',
  'scaleless-skin',
] as const
export type SensitivityCode = (typeof sensitivityCodes)[number]

/**
 * - `avoid`     not to be used in this taxon, or the trait is present
 * - `caution`   only with care
 * - `tolerates` known here to be borne
 * - `none`      an earlier entry no longer holds
 */
export const sensitivityLevels = ['avoid', 'caution', 'tolerates', 'none'] as const
export type SensitivityLevel = (typeof sensitivityLevels)[number]
