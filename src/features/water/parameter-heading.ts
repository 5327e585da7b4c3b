import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { parameterNames } from '../../../shared/messages/water.ts'

/** The name of a parameter at the head of something: "Temperature", but pH as it is written. */
export function parameterHeading(parameter: ReadingParameter): string {
  const name = parameterNames[parameter]
  return parameter === 'ph' ? name : name.charAt(0).toUpperCase() + name.slice(1)
}
