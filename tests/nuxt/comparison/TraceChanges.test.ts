import { mountSuspended } from '@nuxt/test-utils/runtime'
import { describe, expect, it } from 'vitest'
import TraceChanges from '~/components/comparison/TraceChanges.vue'

const props = { changes: ['Not looked into here: the traces of a1, b1.', 'Replaced since: the trace of a2.'], maySave: true, busy: false }

describe('changes of traces', () => {
  it('are named, and a new version can look into them', async () => {
    const notice = await mountSuspended(TraceChanges, { props })
    expect(notice.findAll('li').map(item => item.text())).toEqual(props.changes)
    await notice.get('button').trigger('click')
    expect(notice.emitted('renew')).toHaveLength(1)
  })

  it('offer nothing where the person may not save', async () => {
    const notice = await mountSuspended(TraceChanges, { props: { ...props, maySave: false } })
    expect(notice.find('button').exists()).toBe(false)
    expect(notice.text()).toContain('The verdicts here stay as they were saved.')
  })
})
