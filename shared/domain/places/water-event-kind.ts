/** What is done to the water itself. Each may dilute or remove a drug, so each is a recorded event. */
export const waterEventKinds = ['water-change', 'backwash', 'media-change', 'top-off'] as const
export type WaterEventKind = (typeof waterEventKinds)[number]
