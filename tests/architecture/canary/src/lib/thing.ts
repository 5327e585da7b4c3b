export interface Thing {
  name: string
}

export const thing: Thing = { name: 'thing' }
