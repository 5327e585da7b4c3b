export { PartyChooser } from './choose-party.tsx'
export { PartiesList } from './parties-list.tsx'
export { PartyDialog } from './party-dialog.tsx'
