import '@fontsource/source-sans-3/400.css'
import '@fontsource/source-sans-3/600.css'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { createBrowserRouter, RouterProvider } from 'react-router-dom'
import '../styles/main.css'
import { Providers } from './providers.tsx'
import { routes } from './router.tsx'

const root = document.getElementById('root')
if (root === null) throw new Error('index.html has no element with the id "root"')

createRoot(root).render(
  <StrictMode>
    <Providers>
      <RouterProvider router={createBrowserRouter(routes)} />
    </Providers>
  </StrictMode>,
)
