import type { DOMWrapper, VueWrapper } from '@vue/test-utils'
import type { Component, VNode } from 'vue'
import type { Role } from '#shared/permissions'
import type { StudyView } from '#shared/types/study'

/** The props of a component, a generic one's too. */
export type PropsOf<C> = C extends abstract new (...args: never[]) => { $props: infer P } ? P : C extends (props: infer P, ...rest: never[]) => unknown ? P : never

export interface AskedRequest { method: string, path: string, body: unknown }
/** What the server answers: a value, what `refusal` makes, or a function of what it was asked. */
export type Answer = unknown | ((asked: AskedRequest) => unknown)

/** A component as it stands on a page, and the hands of a person. */
export interface Seen {
  part: VueWrapper
  /** Gives it other props. */
  change: (props: Record<string, unknown>) => Promise<void>
  /** All that is written on the page, dialogs too, with single spaces. */
  text: () => string
  /** The one control of that accessible name. */
  control: (name: string | RegExp) => DOMWrapper<HTMLElement>
  /** Are there controls of that name? */
  has: (name: string | RegExp) => boolean
  /** The one element that a selector finds on the page. */
  find: (selector: string) => DOMWrapper<HTMLElement>
  press: (name: string | RegExp) => Promise<void>
  fill: (name: string | RegExp, value: unknown) => Promise<void>
  send: () => Promise<void>
  emitted: (name: string) => unknown[][]
  asked: readonly AskedRequest[]
  /** Where it led to by itself. */
  went: readonly unknown[]
  /** How often it had the study read again. */
  refreshed: () => number
  until: (check: () => void) => Promise<void>
}

interface Around {
  /** What stands on the page beside it, where it refers to that. */
  beside?: () => VNode
  slots?: Record<string, (props: never) => unknown>
  /** The roles of who is signed in; by default all. */
  roles?: Role[]
  /** The study it stands in is otherwise than `inventedStudy`. */
  study?: Partial<StudyView>
  /** By "METHOD /path"; GET where no method is named. */
  answers?: Record<string, Answer>
}
export type Given<C> = Around & (Record<string, never> extends PropsOf<C> ? { props?: PropsOf<C> } : { props: PropsOf<C> })

export interface ComponentCase extends Around {
  component: Component
  does: string
  props?: Record<string, unknown>
  look: (seen: Seen) => void | Promise<void>
}

/** One component with what it is given, and what it must say or do then. */
export function holds<C extends Component>(component: C, does: string, given: Given<C>, look: ComponentCase['look']): ComponentCase {
  return { ...given as Around & { props?: Record<string, unknown> }, component, does, look }
}

/** Its cases here; or its own component test; or why it has none, and the browser test that drives it. */
export type ComponentRow = ComponentCase[] | { test: string } | { because: string, drivenBy: string }
/** By the path below app/components, without its ending. */
export type ComponentRows = Record<string, ComponentRow>
