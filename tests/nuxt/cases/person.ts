import { expect } from 'vitest'
import DemoAccounts from '~/components/person/DemoAccounts.vue'
import FirstForm from '~/components/person/FirstForm.vue'
import InvitationForm from '~/components/person/InvitationForm.vue'
import NewPasswordField from '~/components/person/NewPasswordField.vue'
import OneTimeLink from '~/components/person/OneTimeLink.vue'
import PasswordForm from '~/components/person/PasswordForm.vue'
import PeopleList from '~/components/person/PeopleList.vue'
import PersonForm from '~/components/person/PersonForm.vue'
import PersonRow from '~/components/person/PersonRow.vue'
import ProfileForm from '~/components/person/ProfileForm.vue'
import RolesField from '~/components/person/RolesField.vue'
import SchemeField from '~/components/person/SchemeField.vue'
import SignedIn from '~/components/person/SignedIn.vue'
import SignInForm from '~/components/person/SignInForm.vue'
import type { ShownPerson } from '~/composables/usePeople'
import { holds, type ComponentRows } from './componentCase'
import { refusal } from './mountCase'

const eve: ShownPerson = { id: 'p2', name: 'Eve Lark', signInName: 'eve', email: 'eve@example.org', roles: ['analyst', 'reviewer'], closedAt: null, hasPassword: true, linkUntil: null }
const inputOf = (element: HTMLElement) => element as HTMLInputElement

export const personRows: ComponentRows = {
  'person/DemoAccounts': [
    holds(DemoAccounts, 'lists who there is, and fills in the form', { answers: { '/api/demo-accounts': { password: 'apple juice here', accounts: [{ signInName: 'analyst', name: 'Eve Lark', roles: ['analyst'] }] } } }, async ({ text, press, emitted }) => {
      expect(text()).toContain('The password of all is apple juice here')
      expect(text()).toContain('Eve Lark, analyst: makes studies')
      await press('Use the account analyst')
      expect(emitted('use')).toEqual([[{ signInName: 'analyst', password: 'apple juice here' }]])
    }),
  ],
  'person/FirstForm': [
    holds(FirstForm, 'sends what was typed, and goes on to the people', { answers: { 'POST /api/first': {} } }, async ({ fill, send, asked, went, until }) => {
      await fill('Code on the console', 'abcd')
      await fill('Your name', 'Ada Moss')
      await fill('Sign-in name', 'ada')
      await fill('Password', 'three words here')
      await send()
      await until(() => expect(went).toEqual(['/people']))
      expect(asked).toContainEqual({ method: 'POST', path: '/api/first', body: { code: 'abcd', name: 'Ada Moss', signInName: 'ada', password: 'three words here' } })
    }),
    holds(FirstForm, 'says beside the field what is wrong with it', { answers: { 'POST /api/first': refusal('This is not the code.', 'code') } }, async ({ send, find, control, until }) => {
      await send()
      await until(() => expect(control('Code on the console').attributes('aria-invalid')).toBe('true'))
      expect(find('[role=alert]').text()).toContain('This is not the code.')
    }),
  ],
  'person/InvitationForm': [
    holds(InvitationForm, 'sets the password of the account it names', { props: { secret: 'abc', signInName: 'eve' }, answers: { 'POST /api/invitations/abc': {} } }, async ({ control, fill, send, asked, went, until }) => {
      expect(inputOf(control('Your sign-in name').element).value).toBe('eve')
      await fill('Password', 'three words here')
      await send()
      await until(() => expect(went).toEqual(['/']))
      expect(asked).toContainEqual({ method: 'POST', path: '/api/invitations/abc', body: { password: 'three words here' } })
    }),
  ],
  'person/NewPasswordField': [
    holds(NewPasswordField, 'shows the password on wish', { props: { modelValue: 'three words here', label: 'New password' } }, async ({ control, fill, text }) => {
      expect(control('New password').attributes()).toMatchObject({ type: 'password', autocomplete: 'new-password' })
      expect(text()).toContain('At least 12 characters')
      await fill('Show it', true)
      expect(control('New password').attributes('type')).toBe('text')
    }),
  ],
  'person/OneTimeLink': [
    holds(OneTimeLink, 'says whose it is and that it is shown once', { props: { address: 'http://127.0.0.1/invitation/abc', name: 'Eve Lark' } }, ({ control, text }) => {
      expect(text()).toContain('set the password of Eve Lark')
      expect(text()).toContain('shown this once')
      expect(inputOf(control('One-time link').element).value).toBe('http://127.0.0.1/invitation/abc')
    }),
  ],
  'person/PasswordForm': [
    holds(PasswordForm, 'changes the password and forgets what was typed', { props: { signInName: 'eve' }, answers: { 'PUT /api/me/password': {} } }, async ({ fill, send, asked, find, control, until }) => {
      await fill('Present password', 'the old words')
      await fill('New password', 'three words here')
      await send()
      await until(() => expect(find('[role=status]').text()).toBe('Changed. You are signed out everywhere else.'))
      expect(asked).toContainEqual({ method: 'PUT', path: '/api/me/password', body: { present: 'the old words', password: 'three words here' } })
      expect(inputOf(control('New password').element).value).toBe('')
    }),
  ],
  'person/PeopleList': [
    holds(PeopleList, 'adds a person and hands on their link', { answers: { '/api/people': [eve], 'POST /api/people': { link: 'http://127.0.0.1/invitation/new' } } }, async ({ press, fill, send, text, control, until }) => {
      expect(text()).toContain('Eve Lark')
      await press('Add a person')
      await fill('Name', 'Noor Vale')
      await send()
      await until(() => expect(text()).toContain('A link for Noor Vale'))
      expect(inputOf(control('One-time link').element).value).toBe('http://127.0.0.1/invitation/new')
    }),
    holds(PeopleList, 'edits the person of the row', { answers: { '/api/people': [eve] } }, async ({ press, find, control }) => {
      await press('Edit')
      expect(find('[role=dialog]').text()).toContain('Edit Eve Lark')
      expect(inputOf(control('Name').element).value).toBe('Eve Lark')
    }),
    holds(PeopleList, 'says why a link could not be made', { answers: { '/api/people': [eve], 'POST /api/people/p2/link': refusal('This account is closed.') } }, async ({ press, find, until }) => {
      await press('New link')
      await until(() => expect(find('[role=alert]').text()).toContain('This account is closed.'))
    }),
  ],
  'person/PersonForm': [
    holds(PersonForm, 'adds a person with their roles', { answers: { 'POST /api/people': { link: 'http://127.0.0.1/invitation/new' } } }, async ({ fill, send, asked, emitted, until }) => {
      await fill('Name', 'Noor Vale')
      await fill('Sign-in name', 'noor')
      await fill(/^scientist/, true)
      await send()
      await until(() => expect(emitted('added')).toEqual([['http://127.0.0.1/invitation/new', 'Noor Vale']]))
      expect(asked.at(-1)?.body).toEqual({ name: 'Noor Vale', signInName: 'noor', email: '', roles: ['scientist'] })
    }),
    holds(PersonForm, 'leaves the sign-in name of an account alone', { props: { person: eve }, answers: { 'PATCH /api/people/p2': {} } }, async ({ has, send, emitted, control, until }) => {
      expect(has('Sign-in name')).toBe(false)
      expect(inputOf(control(/^reviewer/).element).checked).toBe(true)
      await send()
      await until(() => expect(emitted('saved')).toHaveLength(1))
    }),
  ],
  'person/PersonRow': [
    holds(PersonRow, 'says what the account is and offers its acts', { props: { person: { ...eve, linkUntil: '2026-03-01T10:00:00.000Z' }, busy: false } }, async ({ text, press, emitted, find }) => {
      expect(text()).toContain('analyst, reviewer')
      expect(text()).toContain('new link holds until 1 Mar 2026')
      expect(find('[role=group]').attributes('aria-label')).toBe('Eve Lark')
      await press('New link')
      await press('Close')
      expect(emitted('close')).toEqual([])
      await press('Close the account')
      expect([emitted('link').length, emitted('close').length]).toEqual([1, 1])
    }),
    holds(PersonRow, 'reopens a closed account, and nothing else', { props: { person: { ...eve, closedAt: '2026-03-01T10:00:00.000Z' }, busy: false } }, async ({ text, press, has, emitted }) => {
      expect(text()).toContain('closed 1 Mar 2026')
      expect(has('Edit')).toBe(false)
      await press('Reopen')
      expect(emitted('reopen')).toHaveLength(1)
    }),
  ],
  'person/BenchKeysField': { test: 'tests/nuxt/comparison/benchKeys.test.ts' },
  'person/ProfileForm': [
    holds(ProfileForm, 'saves a changed name only', { props: { name: 'Ada Moss' }, answers: { 'PATCH /api/me': {} } }, async ({ control, fill, send, find, asked, until }) => {
      expect(control('Save the name').attributes('disabled')).toBe('')
      await fill('Name', 'Ada Moss-Reed')
      expect(find('[role=status]').text()).toBe('Not saved yet.')
      await send()
      await until(() => expect(find('[role=status]').text()).toBe('Saved.'))
      expect(asked).toContainEqual({ method: 'PATCH', path: '/api/me', body: { name: 'Ada Moss-Reed' } })
    }),
  ],
  'person/RolesField': [
    holds(RolesField, 'adds a role to those that stand, and says what is wrong', { props: { modelValue: ['analyst'], error: 'Choose at least one role.' } }, async ({ fill, emitted, find }) => {
      expect(document.getElementById(find('fieldset').attributes('aria-describedby') ?? '')?.textContent).toBe('Choose at least one role.')
      await fill(/^lab lead/, true)
      expect(emitted('update:modelValue')).toEqual([[['analyst', 'labLead']]])
    }),
  ],
  'person/SchemeField': [
    holds(SchemeField, 'puts the page into the chosen scheme at once', {}, async ({ fill, until }) => {
      await fill('Colours', 'Dark')
      await until(() => expect(document.documentElement.dataset.scheme).toBe('dark'))
      await fill('Colours', 'As this device has it')
      await until(() => expect(document.documentElement.dataset.scheme).toBeUndefined())
    }),
  ],
  'person/SignInForm': [
    holds(SignInForm, 'signs in and goes to the studies', { answers: { 'POST /api/sessions': {} } }, async ({ fill, send, asked, went, until }) => {
      await fill('Sign-in name', 'eve')
      await fill('Password', 'three words here')
      await send()
      await until(() => expect(went).toEqual(['/']))
      expect(asked).toContainEqual({ method: 'POST', path: '/api/sessions', body: { signInName: 'eve', password: 'three words here' } })
    }),
    holds(SignInForm, 'says that it did not, and keeps what was typed', { answers: { 'POST /api/sessions': refusal('Name and password do not fit together.') } }, async ({ fill, send, find, control, went, until }) => {
      await fill('Sign-in name', 'eve')
      await send()
      await until(() => expect(find('[role=alert]').text()).toContain('do not fit together'))
      expect(inputOf(control('Sign-in name').element).value).toBe('eve')
      expect(went).toEqual([])
    }),
  ],
  'person/SignedIn': [
    holds(SignedIn, 'says who is signed in and lets them out', { props: { person: { name: 'Eve Lark', roles: ['analyst', 'labLead'] } }, answers: { 'DELETE /api/sessions': {} } }, async ({ text, control, press, went, until }) => {
      expect(text()).toContain('analyst, lab lead')
      expect(control('Eve Lark').attributes('href')).toBe('/profile')
      await press('Sign out')
      await until(() => expect(went).toEqual(['/sign-in']))
    }),
  ],
}
