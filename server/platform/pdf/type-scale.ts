/** Points for a length given in the look's pixels (96 to the inch). */
export const px = (pixels: number): number => pixels * 0.75

/** Sizes of type in points; the roles of the look's print sheet. */
export const type = {
  dose: px(66),
  doseUnit: px(30),
  subject: px(24),
  title: px(26),
  heading: px(14),
  strong: px(13.5),
  body: px(12.5),
  label: px(11.5),
  footer: px(11),
  /** The smallest a table may shrink to before it is refused. */
  least: px(9.5),
} as const

/** Colours of a print, red, green, blue 0…1. Ink is pure black, so that a printer uses its black alone. */
export const colour = {
  ink: [0, 0, 0],
  second: [0.2, 0.2, 0.2],
  hair: [0.55, 0.55, 0.55],
  paper: [1, 1, 1],
  magenta: [168 / 255, 15 / 255, 107 / 255],
  quarantine: [246 / 255, 199 / 255, 0],
  clearance: [10 / 255, 100 / 255, 73 / 255],
  flagBlue: [0.07, 0.25, 0.55],
  flagRed: [0.75, 0.09, 0.14],
} as const satisfies Record<string, readonly [number, number, number]>

export type Colour = readonly [number, number, number]

/** Left and right room between the frame and the text. */
export const padding = px(16)
