import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { App } from './app/app.tsx'
import { applyPreferences } from './lib/preferences.ts'
import './theme.css'

applyPreferences()

const root = document.getElementById('root')
if (!root) throw new Error('The page has no root to draw in.')
createRoot(root).render(
  <StrictMode>
    <App />
  </StrictMode>,
)
