import { readdirSync, readFileSync } from 'node:fs'
import { dirname, join, relative, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'

const root = fileURLToPath(new URL('../..', import.meta.url))

/** A folder and the folders its files may import from; the most specific folder counts. */
const allowed: Record<string, string[]> = {
  'shared/science': ['shared/science'],
  'shared/permissions': ['shared/permissions'],
  'shared/schemas': ['shared/schemas', 'shared/permissions', 'shared/science'],
  'shared/formats': ['shared/formats', 'shared/schemas', 'shared/science'],
  'server/db': ['server/db', 'shared'],
  'server/workers': ['shared', 'server/workers', 'server/db/packed.ts', 'server/domain/trace/files'],
  'server/domain/trace/files': ['server/domain/trace/files', 'shared'],
  'server/domain': ['server/domain', 'server/db', 'server/jobs', 'shared'],
  'server/jobs': ['server/jobs', 'server/domain', 'server/db', 'shared'],
  'server/api': ['server/domain', 'server/utils', 'server/db/packed.ts', 'shared'],
  'app/charts': ['app/charts', 'app/utils', 'shared'],
  'app/workers': ['app/utils', 'shared'],
  'app/utils': ['app/utils', 'shared'],
  'app/stores': ['app/stores', 'app/utils', 'shared'],
  'app/composables': ['app/composables', 'app/stores', 'app/charts', 'app/utils', 'shared'],
  'app/components': ['app/components', 'app/composables', 'app/stores', 'app/charts', 'app/utils', 'shared'],
}

const filesBelow = (folder: string): string[] => readdirSync(join(root, folder), { withFileTypes: true }).flatMap(entry =>
  entry.isDirectory() ? filesBelow(`${folder}/${entry.name}`) : /\.(?:ts|vue)$/.test(entry.name) ? [`${folder}/${entry.name}`] : [])

function importsOf(file: string): string[] {
  // What a worker is given and gives back is described in the domain; only its types cross over.
  const text = readFileSync(join(root, file), 'utf8').replaceAll(file.startsWith('server/workers') ? /import type .*/g : /(?!)/g, '')
  return [...text.matchAll(/(?:from|import\()\s*'(?<path>[^']+)'/g)].flatMap(({ groups }) => target(file, groups?.path ?? '') ?? [])
}

/** The path of an import within the project; undefined for a package. */
function target(file: string, path: string): string | undefined {
  if (path.startsWith('#shared/')) return path.slice(1)
  if (path.startsWith('~/')) return `app/${path.slice(2)}`
  return path.startsWith('.') ? relative(root, resolve(root, dirname(file), path)) : undefined
}

const within = (path: string, folder: string) => path === folder || path.startsWith(`${folder}/`) || `${path}.ts` === folder

describe('imports run one way', () => {
  it.each(Object.entries(allowed))('%s', (folder, may) => {
    const files = filesBelow(folder)
    expect(files.length).toBeGreaterThan(0)
    const wrong = files.flatMap(file => importsOf(file).filter(path => !may.some(each => within(path, each))).map(path => `${file} imports ${path}`))
    expect(wrong).toEqual([])
  })

  it('keeps science to itself and a short list of numeric packages', () => {
    const packages = filesBelow('shared/science').flatMap((file) => {
      const text = readFileSync(join(root, file), 'utf8')
      return [...text.matchAll(/from '(?<name>[^'.][^']*)'/g)].map(({ groups }) => groups?.name ?? '')
    })
    expect(packages.filter(name => !/^(?:@stdlib\/|simple-statistics$|ml-matrix$|ml-pca$)/.test(name))).toEqual([])
  })
})
