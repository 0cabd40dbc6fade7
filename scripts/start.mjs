// `npm start` and `npm run start:lab`: the first command on a fresh clone. Node's own modules only, for nothing is
// installed yet. Installs and builds where the lock or the sources changed, then serves.
import { spawn, spawnSync } from 'node:child_process'
import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'

const SOURCES = ['app', 'server', 'shared', 'public', 'drizzle', 'scripts', 'nuxt.config.ts', 'tailwind.config.ts', 'package.json', 'package-lock.json']

if (import.meta.main ?? process.argv[1]?.endsWith('start.mjs')) serve(process.argv.includes('--lab') ? 'lab' : 'demo')

export function prepare() {
  upToDate('node_modules/.steelyard-lock', digest(['package-lock.json']), 'Installing packages (a minute or two on first run)', () => run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund']))
  upToDate('.output/.steelyard-sources', digest(SOURCES), 'Building (about half a minute)', () => run(process.execPath, ['node_modules/nuxt/bin/nuxt.mjs', 'build']))
}

function serve(kind) {
  prepare()
  // Worker threads and their large columns come and go: the C library would keep a pool for each thread, and freed columns too.
  const env = { NITRO_SHUTDOWN_TIMEOUT: '3000', MALLOC_ARENA_MAX: '2', MALLOC_MMAP_THRESHOLD_: '1048576', ...process.env, STEELYARD_KIND: kind, NODE_ENV: 'production' }
  env.NITRO_HOST = env.HOST = process.env.STEELYARD_HOST || '127.0.0.1'
  env.NITRO_PORT = env.PORT = process.env.PORT || '3000'
  // Browsers keep a Secure cookie on this machine's own names; elsewhere plain HTTP would lose it.
  const url = process.env.STEELYARD_URL
  if (url?.startsWith('http://') && !env.NUXT_SESSION_COOKIE_SECURE) env.NUXT_SESSION_COOKIE_SECURE = 'false'
  const server = spawn(process.execPath, ['.output/server/index.mjs'], { stdio: 'inherit', env })
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => server.kill(signal))
  server.on('exit', (code, signal) => process.exit(code ?? (signal ? 1 : 0)))
}

function upToDate(stamp, now, sentence, work) {
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === now) return
  console.log(`${sentence} …`)
  work()
  mkdirSync(join(stamp, '..'), { recursive: true })
  writeFileSync(stamp, now)
}

function run(command, args) {
  const { status } = spawnSync(command, args, { stdio: ['ignore', 'ignore', 'inherit'], env: { ...process.env, NODE_ENV: '' } })
  if (status !== 0) {
    console.error(`\`${command} ${args.join(' ')}\` failed; the lines above say why.`)
    process.exit(1)
  }
}

function digest(paths) {
  const hash = createHash('sha256')
  for (const path of paths) for (const file of files(path)) hash.update(file).update(readFileSync(file))
  return hash.digest('hex')
}

function files(path) {
  if (!statSync(path).isDirectory()) return [path]
  return readdirSync(path).sort().flatMap(name => files(join(path, name)))
}
