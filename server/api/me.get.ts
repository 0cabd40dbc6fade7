/** Who is signed in, or null; and whether this is a demo laboratory. */
export default defineRoute(async (event) => {
  return { person: await readPerson(event), demo: useLaboratory().kind === 'demo' }
})
