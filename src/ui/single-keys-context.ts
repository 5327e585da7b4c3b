import { createContext, useContext } from 'react'

/** Whether the person wants single-letter keys; they can be turned off (WCAG 2.1.4). */
export const SingleKeysContext = createContext(true)

export function useSingleKeysOn(): boolean {
  return useContext(SingleKeysContext)
}
