import { createContext, useContext } from 'react'

/** A short word about something that went well. Never for errors or cautions: those stay on the sheet. */
export interface ToastWords {
  words: string
  /** An undo, or a link opened by the caller. */
  act?: { words: string; run: () => void }
}

export const ToastContext = createContext<(toast: ToastWords) => void>(() => {})

/** Says something at the foot of the chart for 6 seconds, politely announced. */
export function useToast(): (toast: ToastWords) => void {
  return useContext(ToastContext)
}
