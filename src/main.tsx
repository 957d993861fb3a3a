import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { App } from './app/app.tsx'
import { applyPreferences } from './lib/preferences.ts'
import { reloadForNewerBuild } from './lib/newer-build.ts'
import './theme.css'

applyPreferences()
reloadForNewerBuild()

const root = document.getElementById('root')
if (!root) throw new Error('The page has no root to draw in.')
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
)
