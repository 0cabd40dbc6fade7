import migrations from '#migrations'
import workerSources from '#workers'
import { openDatabase, type Database } from '../db/open'
import { jobKinds } from '../jobs'
import { Jobs } from '../jobs/runner'
import { demoAccounts, demoPassword } from '../domain/demo/accounts'
import { addDemoAccounts } from '../domain/demo/addDemoAccounts'
import { issueFirstCode } from '../domain/person/firstLabLead'
import { addressProblem, dataFolder, laboratoryKind, ownAddress } from '../utils/environment'
import { sealingSecret } from '../utils/sealingSecret'
import { emptyIncoming } from '../domain/upload/incoming'
import { sweepFiles } from '../domain/table/originals'
import { dropExpiredUploads } from '../domain/table/removeUpload'
import { sweepTraceFiles } from '../domain/trace/traceFiles'

/** Opens the laboratory before the first request: folder, lock, migrations, sealing secret, jobs. */
export default defineNitroPlugin((nitro) => {
  const kind = laboratoryKind()
  const folder = dataFolder(kind)
  const opening = start().catch((error: Error) => {
    console.error(error.message)
    process.exit(1)
  })

  async function start() {
    const { stop, notice } = addressProblem(process.env)
    if (stop) throw new Error(stop)
    if (notice) console.warn(notice)
    const open = await openDatabase(folder, kind, migrations)
    emptyIncoming(folder)
    sweepFiles(open.db, folder)
    sweepTraceFiles(open.db, folder)
    dropExpiredUploads(open.db, folder)
    // Read by nuxt-auth-utils at each request.
    process.env.NUXT_SESSION_PASSWORD ||= sealingSecret(folder)
    const jobs = new Jobs({ db: open.db, folder }, jobKinds, workerSources)
    setLaboratory({ ...open, kind, folder, jobs })
    jobs.resume()
    await welcome(open.db)
  }

  /** A demo laboratory has its accounts at once; a real one without any shows how to make the first. */
  async function welcome(db: Database) {
    if (kind === 'demo') {
      await addDemoAccounts(db, passwordHasher)
      console.log(`Demo laboratory with invented data. Open ${ownAddress()} and sign in as ${demoAccounts.map(account => account.signInName).join(', ')} with the password: ${demoPassword}`)
      return startDemo(useLaboratory())
    }
    const code = issueFirstCode(db)
    if (code) console.log(`This laboratory has no account yet. Open ${ownAddress()}/first and make the first lab lead with this code (24 hours, once):\n\n    ${code}\n`)
  }

  nitro.hooks.hook('request', () => opening)
  nitro.hooks.hook('close', async () => {
    await opening
    const { jobs, close } = useLaboratory()
    await stopDemo()
    await jobs.stop()
    close()
    setLaboratory(undefined)
  })
})
