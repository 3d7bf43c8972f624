/** Builds the service worker for built pages: the list of what it keeps can only be made once they are there. */
import { createHash } from 'node:crypto'
import { readFile, readdir } from 'node:fs/promises'
import { join } from 'node:path'
import { root } from './places.mjs'

/** What pages are made of. The pictures of the installed application are the system's to keep. */
const kept = /\.(js|css|html|svg|woff2)$/
/** Kept by no device: who writes articles needs the server anyhow, and for all others it is dead weight. */
const forWriters = /^assets\/markdown-editor-/
const name = 'sw.js'

async function listBuilt(folder) {
  const entries = await readdir(folder, { recursive: true, withFileTypes: true })
  const paths = entries
    .filter((entry) => entry.isFile())
    .map((entry) => join(entry.parentPath, entry.name).slice(folder.length + 1))
  return paths
    .filter((path) => kept.test(path) && !forWriters.test(path) && !path.startsWith('.') && path !== name)
    .sort()
}

async function asEntry(folder, path) {
  // Files under assets/ carry their hash in their name; the others change under the same one.
  if (path.startsWith('assets/')) return { url: `/${path}`, revision: null }
  const hash = createHash('sha256').update(await readFile(join(folder, path)))
  return { url: `/${path}`, revision: hash.digest('hex').slice(0, 16) }
}

/**
 * Writes sw.js into a folder of built pages. It changes whenever one of them does.
 * @param folder where they lie, without those of former builds
 */
export async function buildWorker(folder) {
  const files = await Promise.all((await listBuilt(folder)).map((path) => asEntry(folder, path)))
  const { build } = await import('vite')
  await build({
    root,
    configFile: false,
    publicDir: false,
    logLevel: 'warn',
    define: { builtFiles: JSON.stringify(files), 'process.env.NODE_ENV': '"production"' },
    build: {
      outDir: folder,
      emptyOutDir: false,
      target: 'es2022',
      rolldownOptions: {
        input: join(root, 'src/offline/shell-worker.ts'),
        output: { format: 'iife', entryFileNames: name },
      },
    },
  })
}
