export { NewPerson } from './new-person.tsx'
export { PeopleList } from './people-list.tsx'
export { PersonSheet } from './person-sheet.tsx'
