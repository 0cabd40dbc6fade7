// `npm test`: the first command on a fresh clone. Installs what tests need, then lint, types and every test project,
// and closes with a line `N passed, N failed`.
import { spawnSync } from 'node:child_process'
import { existsSync, readFileSync, rmSync } from 'node:fs'
import { prepare } from './start.mjs'

const CHROMIUM = '/usr/bin/chromium'

prepare()
installChromium()
let passed = 0
/** What failed, in words: told once more at the end, where a long record is read first. */
const failures = []
step('lint', 'npx', ['eslint', '.', '--max-warnings', '0'])
step('types', 'npx', ['nuxt', 'typecheck'])
tests('unit', 'reference', 'server', 'nuxt')
tests('browser')
for (const failure of failures) console.log(`\nFAILED ${failure}`)
console.log(`\n${passed} passed, ${failures.length} failed`)
process.exit(failures.length > 0 ? 1 : 0)

function step(name, command, args) {
  console.log(`\n== ${name}`)
  const { status } = spawnSync(command, args, { stdio: 'inherit' })
  if (status === 0) passed++
  else failures.push(name)
}

/** The browser tests come after the others: they want the machine to themselves. */
function tests(...projects) {
  const results = `test-results/${projects[0]}.json`
  rmSync(results, { force: true })
  console.log(`\n== tests: ${projects.join(', ')}`)
  const { status } = spawnSync('npx', ['vitest', 'run', ...projects.flatMap(name => ['--project', name]), '--reporter=default', '--reporter=json', `--outputFile.json=${results}`], { stdio: 'inherit' })
  const counted = existsSync(results) ? JSON.parse(readFileSync(results, 'utf8')) : { numPassedTests: 0, testResults: [] }
  passed += counted.numPassedTests
  const failed = counted.testResults.flatMap(file => file.assertionResults.filter(test => test.status === 'failed')
    .map(test => `${file.name}: ${test.fullName}\n${test.failureMessages.join('\n')}`))
  failures.push(...failed)
  // A run may fail without a failed test: an error outside one, or a file that can't be read.
  if (status !== 0 && failed.length === 0) failures.push(`${projects.join(', ')}: ended with ${status}, though no test failed`)
}

function installChromium() {
  if (existsSync(CHROMIUM)) return
  if (process.getuid?.() !== 0) {
    console.error(`Browser tests need Debian's chromium at ${CHROMIUM}: apt-get install chromium`)
    process.exit(1)
  }
  console.log('Installing chromium …')
  for (const args of [['update', '-q'], ['install', '-y', '-q', '--no-install-recommends', 'chromium']]) {
    if (spawnSync('apt-get', args, { stdio: ['ignore', 'ignore', 'inherit'], env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' } }).status !== 0) process.exit(1)
  }
}
