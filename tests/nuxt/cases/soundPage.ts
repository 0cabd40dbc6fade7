const CONTROLS = 'a[href], button, input:not([type=hidden]):not([hidden]), select, textarea, summary'
const NAMED = `${CONTROLS}, [role=img], [role=dialog], [role=region], [role=progressbar], [role=grid], [role=group], [role=tab], aside, nav`
const squeezed = (text: string | null | undefined) => (text ?? '').replace(/\s+/g, ' ').trim()

/** The text that is read out: what is hidden left away, and the names of images put in. */
function spokenText(element: Element): string {
  const copy = element.cloneNode(true) as Element
  for (const hidden of copy.querySelectorAll('[aria-hidden=true], select, input, textarea')) hidden.remove()
  for (const image of copy.querySelectorAll('[role=img][aria-label]')) image.textContent = image.getAttribute('aria-label')
  return squeezed(copy.textContent)
}

const byId = (id: string) => document.querySelector(`[id="${id}"]`)

/** The accessible name as far as these pages use it: labelledby, label, the field's label, its text, its title. */
export function nameOf(element: Element): string {
  const labelledBy = (element.getAttribute('aria-labelledby') ?? '').split(' ').filter(Boolean).map(id => spokenText(byId(id) ?? document.createElement('i'))).join(' ')
  const isField = element.matches('input, select, textarea')
  const label = isField && (element.id ? document.querySelector(`label[for="${element.id}"]`) : null) || (isField ? element.closest('label') : null)
  return squeezed(labelledBy) || squeezed(element.getAttribute('aria-label')) || (label ? spokenText(label) : '')
    || (isField ? '' : spokenText(element)) || squeezed(element.getAttribute('title'))
}

export const controls = () => [...document.querySelectorAll<HTMLElement>(`${CONTROLS}, [role=tab]`)]
export const pageText = () => squeezed(document.body.textContent)

/** Faults that no page may have, whatever it shows. */
export function faultsOfPage(): string[] {
  const faults: string[] = []
  const html = document.body.innerHTML
  for (const [found] of html.matchAll(/.{0,40}(?:\bNaN\b|\bInfinity\b|\bundefined\b|\[object ).{0,20}/g)) faults.push(`no value, but: ${found}`)
  for (const element of document.querySelectorAll(NAMED)) if (nameOf(element) === '') faults.push(`without a name: ${element.outerHTML.slice(0, 160)}`)
  const ids = [...document.querySelectorAll('[id]')].map(element => element.id)
  for (const id of new Set(ids.filter((each, place) => ids.indexOf(each) !== place))) faults.push(`two elements have the id ${id}`)
  for (const attribute of ['for', 'aria-labelledby', 'aria-describedby']) {
    for (const element of document.querySelectorAll(`[${attribute}]`)) {
      for (const id of (element.getAttribute(attribute) ?? '').split(' ').filter(Boolean)) if (!byId(id)) faults.push(`${attribute} names ${id}, which is not there`)
    }
  }
  return faults
}
