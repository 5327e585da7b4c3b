import '@fontsource/roboto-flex/latin-400.css'
import '@fontsource-variable/roboto-flex/wdth.css'
import './app.css'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { Application } from './app/application.tsx'
import { startTheme } from './lib/theme.ts'

startTheme()
const root = document.getElementById('root')
if (root) {
  createRoot(root).render(
    <StrictMode>
      <Application />
    </StrictMode>,
  )
}
