// `npx tsx --tsconfig .nuxt/tsconfig.server.json scripts/writeDemoFiles.ts`: writes public/demo anew from the demo's seed.
import { mkdirSync, rmSync, writeFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { publicDemoFiles } from '../server/domain/demo/publicFiles'

const folder = fileURLToPath(new URL('../public/demo/', import.meta.url))
rmSync(folder, { recursive: true, force: true })
mkdirSync(folder, { recursive: true })
for (const { name, text } of publicDemoFiles()) writeFileSync(folder + name, text)
