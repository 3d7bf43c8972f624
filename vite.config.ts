import tailwind from '@tailwindcss/vite'
import react from '@vitejs/plugin-react'
import { defineConfig } from 'vitest/config'

// Every run makes a database cluster of its own, so that two runs never meet.
const globalSetup = ['tests/server/cluster.mjs']

export default defineConfig({
  plugins: [react(), tailwind()],
  build: {
    target: 'es2022',
    // The page's policy takes fonts and pictures from its own origin alone, so none may become a data: address.
    assetsInlineLimit: 0,
    manifest: true,
    rolldownOptions: {
      output: {
        // Every page carries these: in one piece they are packed best, and an update leaves them in the cache.
        codeSplitting: {
          groups: [
            {
              name: 'base',
              test: /node_modules\/(react|react-dom|react-router|react-router-dom|scheduler|@tanstack|zod|idb)\//,
            },
            // What lies on the device, and the way to the server, in one piece for the same reason.
            {
              name: 'device',
              test: /src\/(api|offline\/(database|whose|person|new-id|sheets|settings|files))\.ts$|\/(me|roles)\.contract\.ts$/,
            },
          ],
        },
      },
    },
  },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'node',
          environment: 'node',
          include: ['tests/{rules,server,commands,lint}/**/*.test.ts'],
          globalSetup,
          // Thirty passwords checked, or a thousand cases ranked, take their time on a busy machine.
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          environment: 'node',
          include: ['tests/browser/**/*.test.{ts,tsx}'],
          globalSetup,
          // Each file drives a browser of its own; two cores carry two of them.
          maxWorkers: 2,
          testTimeout: 60_000,
          hookTimeout: 90_000,
        },
      },
    ],
  },
})
