export const load = () => import('mathjs')
