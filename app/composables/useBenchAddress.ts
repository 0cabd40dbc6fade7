import { useTimeoutFn } from '@vueuse/core'
import { queryToView, stepsOf, viewFields, viewToQuery, type Query } from '~/utils/benchView'

const KEYS = Object.values(viewFields).map(({ key }) => key)
/** A burst of changes makes one address. */
const PAUSE_MS = 120

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
  const { start, stop } = useTimeoutFn(() => {
    const query = viewToQuery(bench.$state)
    ours = textOf(query)
    if (ours === textOf(route.query)) return
    const isStep = stepsOf(bench.$state) !== before
    before = stepsOf(bench.$state)
    void router[isStep ? 'push' : 'replace']({ query: { ...route.query, ...query }, hash: route.hash })
  }, PAUSE_MS, { immediate: false })
  watch(() => bench.$state, start, { deep: true })
  // Whoever goes back or away at once is not held by what was done just before.
  onScopeDispose(router.beforeEach((to) => {
    if (to.path !== route.path || textOf(to.query) !== ours) stop()
  }))
}
