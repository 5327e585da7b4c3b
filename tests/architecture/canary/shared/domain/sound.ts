const day = 86_400_000

/** The day after an instant. */
export const dayAfter = (at: Date) => new Date(at.getTime() + day).getUTCDate()
