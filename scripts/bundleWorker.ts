import { fileURLToPath } from 'node:url'
import { buildSync } from 'esbuild'

/** Bundles a worker's entry file to CommonJS text for `new Worker(text, { eval: true })`. */
export function bundleWorker(entry: string): string {
  const result = buildSync({
    entryPoints: [entry],
    bundle: true,
    write: false,
    platform: 'node',
    format: 'cjs',
    target: 'node20',
    alias: { '#shared': fileURLToPath(new URL('../shared', import.meta.url)) },
    logLevel: 'silent',
  })
  return result.outputFiles[0]!.text
}
