import { addBenchStudy } from './support/benchStudy'
import { launchBrowser } from './support/browser'
import { signInCookie } from './support/signIn'
import { spawn } from 'node:child_process'
import { readFileSync } from 'node:fs'
const study = await addBenchStudy(300)
const url = 'http://127.0.0.1:4106'
const child = spawn(process.execPath, ['.output/server/index.mjs'], { env: { ...process.env, NODE_ENV: 'production', HOST: '127.0.0.1', NITRO_HOST: '127.0.0.1', PORT: '4106', NITRO_PORT: '4106', STEELYARD_KIND: 'lab', STEELYARD_DATA: study.folder, NUXT_SESSION_COOKIE_SECURE: 'false' } })
for (let i = 0; i < 200; i++) { try { await fetch(url + '/api/me'); break } catch { await new Promise(r => setTimeout(r, 100)) } }
const cookie = await signInCookie(url, 'analyst')
const browser = await launchBrowser()
const c = await browser.newContext()
await c.addCookies(cookie.split('; ').map(pair => { const [name = '', ...rest] = pair.split('='); return { name, value: rest.join('='), url } }))
const page = await c.newPage()
page.on('console', (m) => { const t = m.text(); console.log(t.slice(0, 1500)); const [, f, l, col] = /_nuxt\/(\S+\.js) (\d+) (\d+)/.exec(t) ?? []; if (f) { const line = readFileSync('.output/public/_nuxt/' + f, 'utf8').split('\n')[Number(l) - 1] ?? ''; console.log(line.slice(Number(col) - 700, Number(col) + 100)) } })
await page.addInitScript(`document.addEventListener('securitypolicyviolation', e => console.error('V '+e.blockedURI+' '+e.sourceFile+' '+e.lineNumber+' '+e.columnNumber+' '+e.sample))`)
await page.goto(url + study.path, { waitUntil: 'networkidle' })
await browser.close(); child.kill()
