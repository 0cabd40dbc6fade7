import type { LayoutAnswers } from '#shared/science/table/layout'
import { proposeLayout } from '#shared/science/table/proposeLayout'
import type { LayoutQuestion, ProposalBasis } from '#shared/science/table/tableProposal'

export type AskedQuestion = LayoutQuestion & { confirm: boolean }

/** A person's answers to one file's layout, with the proposal that follows from them at once: the same function that the server asks. */
export function useLayoutForm(basis: ProposalBasis) {
  const answers = ref<LayoutAnswers>({ ...basis.answers })
  const asked = ref(new Map<string, AskedQuestion>())
  const proposal = computed(() => proposeLayout(basis.survey, answers.value))
  const first = proposeLayout(basis.survey, basis.answers, basis.remembered)

  // A question stays in sight once it has been asked, so that an answer can be changed.
  function note(questions: readonly LayoutQuestion[], confirm: boolean) {
    for (const question of questions) if (!asked.value.has(question.field)) asked.value.set(question.field, { ...question, confirm })
  }
  note(first.confirmations, true)
  watch(proposal, ({ questions, confirmations }) => {
    note(questions, false)
    note(confirmations, true)
  }, { immediate: true })

  function set<Field extends keyof LayoutAnswers>(field: Field, value: LayoutAnswers[Field] | undefined) {
    const next = { ...answers.value, [field]: value }
    if (value === undefined) Reflect.deleteProperty(next, field)
    answers.value = next
  }
  /** What is chosen of a question: the answer, or the guess that is to be confirmed. */
  const chosen = (question: AskedQuestion): unknown => answers.value[question.field] ?? (question.confirm ? question.choices[0]?.value : undefined)
  /** All answers, with the guesses that reading confirms. */
  const complete = computed<LayoutAnswers>(() => Object.fromEntries([...Object.entries(answers.value), ...proposal.value.confirmations.map(question => [question.field, question.choices[0]?.value])]) as LayoutAnswers)
  return { answers, asked, proposal, set, chosen, complete }
}
