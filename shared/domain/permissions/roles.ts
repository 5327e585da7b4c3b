/** The five roles of an institution's people. One person may hold several; their rights are the union. */
export const roles = ['veterinarian', 'technician', 'keeper', 'registrar', 'administrator'] as const
export type Role = (typeof roles)[number]
