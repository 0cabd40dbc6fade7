import { useDebounceFn } from '@vueuse/core'
import { queryToView, stepsOf, viewFields, viewToQuery, type Query } from '~/utils/benchView'

const KEYS = Object.values(viewFields).map(({ key }) => key)

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

  let before = stepsOf(bench.$state)
  watch(() => textOf(route.query), (text) => {
    if (text === ours) return
    ours = text
    bench.show(queryToView(route.query))
    before = stepsOf(bench.$state)
  })
  // What was done last on a bench must not land in the address of the page after it.
  let left = false
  onScopeDispose(() => left = true)
  const write = useDebounceFn(() => {
    if (left) return
    const query = viewToQuery(bench.$state)
    ours = textOf(query)
    if (ours === textOf(route.query)) return
    const isStep = stepsOf(bench.$state) !== before
    before = stepsOf(bench.$state)
    void router[isStep ? 'push' : 'replace']({ query: { ...route.query, ...query }, hash: route.hash })
  }, 120)
  watch(() => bench.$state, write, { deep: true })
}
