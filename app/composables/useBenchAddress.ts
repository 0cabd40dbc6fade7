import { useDebounceFn } from '@vueuse/core'
import { queryToView, viewToQuery, type Query } from '~/utils/benchView'

const KEYS = Object.keys(viewToQuery(queryToView({})))

/**
 * Keeps the store of the bench and the query of the address the same, both ways. Filters and sorting make a step that
 * "back" takes back; moving from feature to feature and typing do not.
 */
export function useBenchAddress() {
  const route = useRoute()
  const router = useRouter()
  const bench = useBenchStore()
  bench.show(queryToView(route.query))

  let ours = ''
  const textOf = (query: Query | typeof route.query) => KEYS.map(key => query[key] ?? '').join('\n')

  const stepped = () => JSON.stringify([bench.verdicts, bench.flags, bench.sort])
  let before = stepped()
  watch(() => textOf(route.query), (text) => {
    if (text === ours) return
    ours = text
    bench.show(queryToView(route.query))
    before = stepped()
  })
  // What was done last on a bench must not land in the address of the page after it.
  let left = false
  onScopeDispose(() => left = true)
  const write = useDebounceFn(() => {
    if (left) return
    const query = viewToQuery(bench.$state)
    ours = textOf(query)
    if (ours === textOf(route.query)) return
    const isStep = stepped() !== before
    before = stepped()
    void router[isStep ? 'push' : 'replace']({ query: { ...route.query, ...query }, hash: route.hash })
  }, 120)
  watch(() => bench.$state, write, { deep: true })
}
