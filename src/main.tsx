import { QueryClientProvider } from '@tanstack/react-query'
import { StrictMode } from 'react'
import { createRoot } from 'react-dom/client'
import { createBrowserRouter, RouterProvider } from 'react-router-dom'
import './app/app.css'
import { queryClient } from './app/query-client.ts'
import { bringLibrary, bringTriage, routes } from './app/routes.tsx'

const root = document.getElementById('root')
if (root === null) throw new Error('index.html has no #root')

createRoot(root).render(
  <StrictMode>
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={createBrowserRouter(routes)} />
    </QueryClientProvider>
  </StrictMode>,
)

/** Everything must open in a cellar: it is fetched while there still is a network, the check before all else. */
async function bringAhead(): Promise<void> {
  await bringTriage().catch(() => undefined)
  await import('./sheets/send-sheets.ts').then(({ keepSending }) => keepSending()).catch(() => undefined)
  await bringLibrary().catch(() => undefined)
  // Under hot reload nothing may be kept. Brought last: what it keeps has come by then.
  if (import.meta.env.PROD) await (await import('./offline/worker.ts')).startWorker()
}
const whenIdle = window.requestIdleCallback ?? ((run: () => void) => setTimeout(run, 1500))
whenIdle(() => void bringAhead().catch(() => undefined))
