import { paths } from '../lib/paths.ts'

/**
 * Pages of the person's menu that are in this version. As with the sheets: what is not built is not offered.
 */
export const landedPages: ReadonlySet<string> = new Set<string>([
  paths.ownSettings(),
  paths.people(),
  paths.facility(),
  paths.rules(),
  paths.audit(),
])
