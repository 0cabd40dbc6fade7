import type { UploadAnswer } from '#shared/types/table'
import { sizeOf } from '~/utils/sizeOf'

export interface Sending {
  key: number
  name: string
  bytes: number
  sent: number
  /** waiting: for its turn. sending: bytes are under way. known: the study has it. failed: it did not arrive, or was refused. */
  state: 'waiting' | 'sending' | 'known' | 'failed'
  sentence: string
}

/** Where files go, and what one may be. */
export interface SendingPlace {
  address: string
  mostBytes: number
  /** What one of them is: "a feature table". */
  what: string
  /** More for the query of each, asked when it is added. */
  query?: () => Record<string, string>
}

const AT_ONCE = 2

/** Sends files one request each, two at a time, with progress; what arrives whole leaves the list and goes on in the list of uploads. */
export function useFileSending({ address, mostBytes, what, query }: SendingPlace, onArrival: () => void) {
  const sendings = ref<Sending[]>([])
  const files = new Map<number, { file: File, query: Record<string, string> }>()
  const requests = new Map<number, XMLHttpRequest>()
  let nextKey = 0

  function add(chosen: Iterable<File>, replaces?: string) {
    for (const file of chosen) {
      const key = nextKey++
      const tooLarge = file.size > mostBytes
      const sentence = tooLarge ? `Not sent: it has ${sizeOf(file.size)}, and ${what} may have at most ${sizeOf(mostBytes)}.` : file.size === 0 ? 'Not sent: the file is empty.' : 'Waits for its turn.'
      if (!tooLarge && file.size > 0) files.set(key, { file, query: { ...query?.(), ...(replaces ? { replaces } : {}) } })
      sendings.value.push({ key, name: file.name, bytes: file.size, sent: 0, state: files.has(key) ? 'waiting' : 'failed', sentence })
    }
    next()
  }

  function next() {
    const under = sendings.value.filter(one => one.state === 'sending').length
    for (const one of sendings.value.filter(each => each.state === 'waiting').slice(0, AT_ONCE - under)) send(one)
  }

  function send(sending: Sending) {
    const entry = files.get(sending.key)
    if (!entry) return
    const request = new XMLHttpRequest()
    requests.set(sending.key, request)
    Object.assign(sending, { state: 'sending', sentence: '' })
    request.upload.onprogress = event => sending.sent = event.loaded
    request.onload = () => request.status === 202 ? arrived(sending, JSON.parse(request.responseText) as UploadAnswer) : failed(sending, sentenceIn(request.responseText))
    request.onerror = () => failed(sending, 'The connection was lost. Nothing of the file was kept.')
    request.open('POST', `${address}?${new URLSearchParams({ name: entry.file.name, ...entry.query })}`)
    request.setRequestHeader('content-type', 'application/octet-stream')
    request.send(entry.file)
  }

  function arrived(sending: Sending, answer: UploadAnswer) {
    if (answer.known === null) drop(sending.key)
    else end(sending, 'known', answer.known)
    onArrival()
  }
  function failed(sending: Sending, sentence: string) {
    end(sending, 'failed', sentence)
  }
  function end(sending: Sending, state: 'known' | 'failed', sentence: string) {
    Object.assign(sending, { state, sentence })
    requests.delete(sending.key)
    next()
  }
  /** Stops a file that is under way, or takes a finished line off the list. */
  function drop(key: number) {
    requests.get(key)?.abort()
    requests.delete(key)
    files.delete(key)
    sendings.value = sendings.value.filter(one => one.key !== key)
    next()
  }
  function again(key: number) {
    const sending = sendings.value.find(one => one.key === key)
    if (!sending || !files.has(key)) return
    Object.assign(sending, { state: 'waiting', sent: 0, sentence: 'Waits for its turn.' })
    next()
  }
  const canRetry = (key: number) => files.has(key)
  onScopeDispose(() => requests.forEach(request => request.abort()))
  return { sendings, add, drop, again, canRetry }
}

function sentenceIn(text: string): string {
  try {
    const body: unknown = JSON.parse(text)
    if (typeof body === 'object' && body !== null && 'message' in body && typeof body.message === 'string' && body.message !== '') return body.message
  }
  catch {
    // No JSON: the sentence below says all there is to say.
  }
  return 'The server did not take this file. Please try again.'
}
