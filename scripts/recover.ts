// `npm run recover -- NAME`: a one-time link for a locked-out lab lead, on the machine itself, whether the server runs or not.
// Without a name it lists the lab leads. STEELYARD_DATA and STEELYARD_URL as for `npm run start:lab`.
import { openBeside } from '../server/db/openBeside'
import { listLabLeads } from '../server/domain/person/listPeople'
import { recoverLabLead } from '../server/domain/person/recover'
import { dataFolder, ownAddress } from '../server/utils/environment'

try {
  recover(process.argv[2]?.toLowerCase())
}
catch (error) {
  console.error(error instanceof Error ? error.message : error)
  process.exitCode = 1
}

function recover(signInName: string | undefined) {
  const { db, close } = openBeside(dataFolder('lab'))
  try {
    if (!signInName) return console.log(overview(listLabLeads(db)))
    const { name, secret } = recoverLabLead(db, signInName)
    console.log(`A one-time link for ${name}; it sets a new password, works once, and holds for 7 days:\n\n    ${ownAddress()}/invitation/${secret}\n`)
  }
  finally {
    close()
  }
}

function overview(leads: { name: string, signInName: string }[]): string {
  if (leads.length === 0) return 'There is no lab lead yet. Start the server with `npm run start:lab`: it prints a code for the first one.'
  const lines = leads.map(({ name, signInName }) => `    npm run recover -- ${signInName}    (${name})`)
  return `Lab leads of this laboratory. For a one-time link that sets a new password, run:\n\n${lines.join('\n')}\n`
}
