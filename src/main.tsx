import { QueryClientProvider } from '@tanstack/react-query'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { createBrowserRouter, RouterProvider } from 'react-router-dom'
import './app/app.css'
import { queryClient } from './app/query-client.ts'
import { bringTriage, routes } from './app/routes.tsx'

const root = document.getElementById('root')
if (root === null) throw new Error('index.html has no #root')

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={createBrowserRouter(routes)} />
    </QueryClientProvider>
  </StrictMode>,
)

// The check must open in a cellar: its part is fetched while there still is a network.
const whenIdle = window.requestIdleCallback ?? ((run: () => void) => setTimeout(run, 1500))
whenIdle(() => {
  void bringTriage().catch(() => undefined)
  void import('./sheets/send-sheets.ts').then(({ keepSending }) => keepSending()).catch(() => undefined)
})
