import '@fontsource/roboto-flex/latin-400.css'
import '@fontsource-variable/roboto-flex/wdth.css'
import './app.css'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { Application } from './app/application.tsx'
import { startAtSignIn } from './app/start-at-sign-in.ts'
import { createQueryClient } from './lib/query-client.ts'
import { startMessageLocale } from './lib/message-locale.ts'
import { startTheme } from './lib/theme.ts'

startTheme()
if (import.meta.env.DEV || import.meta.env.VITE_PARTS === '1') startMessageLocale()
const root = document.getElementById('root')
const client = createQueryClient()
await startAtSignIn(client)
if (root) {
  createRoot(root).render(
    <StrictMode>
      <Application client={client} />
    </StrictMode>,
  )
}
