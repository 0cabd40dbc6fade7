import type { Problem } from '~/utils/problem'
import { toProblem } from '~/utils/problem'

/** One act that asks the server for a change: whether it is under way, what was wrong, and what was wrong with a field. */
export function useSubmit<Args extends unknown[], T>(act: (...args: Args) => Promise<T>) {
  const busy = ref(false)
  const problem = ref<Problem | null>(null)
  async function submit(...args: Args): Promise<T | undefined> {
    busy.value = true
    problem.value = null
    try {
      return await act(...args)
    }
    catch (error) {
      problem.value = toProblem(error)
      return undefined
    }
    finally {
      busy.value = false
    }
  }
  const issue = (name: string) => problem.value?.issues.find(each => each.field === name)?.sentence
  return { busy, problem, submit, issue }
}
