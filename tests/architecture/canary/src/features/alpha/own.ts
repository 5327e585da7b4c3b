export const inside = 1
