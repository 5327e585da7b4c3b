export { FacilitySettings } from './facility-settings.tsx'
