import migrations from '#migrations'
import workerSources from '#workers'
import { openDatabase } from '../db/open'
import { jobKinds } from '../jobs'
import { Jobs } from '../jobs/runner'
import { dataFolder, laboratoryKind } from '../utils/environment'
import { sealingSecret } from '../utils/sealingSecret'
import { emptyIncoming } from '../domain/table/incoming'

/** Opens the laboratory before the first request: folder, lock, migrations, sealing secret, jobs. */
export default defineNitroPlugin((nitro) => {
  const kind = laboratoryKind()
  const folder = dataFolder(kind)
  const opening = start().catch((error: Error) => {
    console.error(error.message)
    process.exit(1)
  })

  async function start() {
    const open = await openDatabase(folder, kind, migrations)
    emptyIncoming(folder)
    // Read by nuxt-auth-utils at each request.
    process.env.NUXT_SESSION_PASSWORD ||= sealingSecret(folder)
    const jobs = new Jobs({ db: open.db, folder }, jobKinds, workerSources)
    setLaboratory({ ...open, kind, folder, jobs })
    jobs.resume()
  }

  nitro.hooks.hook('request', () => opening)
  nitro.hooks.hook('close', async () => {
    await opening
    const { jobs, close } = useLaboratory()
    await jobs.stop()
    close()
    setLaboratory(undefined)
  })
})
