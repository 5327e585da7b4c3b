interface Course {
  doses: number
  discontinued: boolean
  done_keys: readonly string[]
  given: readonly { at: string; ended: string | null }[]
}

/**
 * When nothing more is to be given and everything given is over: the end of the last bath, or of the last agent taken out
 * of the water; null while it runs, and where nothing went in.
 */
export function courseEndedAt({ given, discontinued, done_keys, doses }: Course): Date | null {
  const allDone = Array.from({ length: doses }, (_, i) => String(i + 1)).every((key) =>
    done_keys.includes(key),
  )
  if (given.length === 0 || !(allDone || discontinued)) return null
  const ends = given.map(({ ended }) => ended)
  if (ends.includes(null)) return null
  return new Date(Math.max(...ends.map((end) => Date.parse(end ?? ''))))
}
