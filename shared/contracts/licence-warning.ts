import { z } from 'zod'
import { licenceWarningLevels } from '../domain/licences/licence-warning.ts'

/** That a licence ends soon, or has ended with none in its place. */
export const LicenceWarning = z.object({
  level: z
    .enum(licenceWarningLevels)
    .exclude(['none'])
    .describe('How near the end is, by the settings of the facility'),
  daysLeft: z.int().describe('Days of the facility to the last day; negative after it'),
})
