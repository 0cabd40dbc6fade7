import { Server } from 'node:http'
import type { Socket } from 'node:net'
import type { H3Event } from 'h3'
import { DomainError } from '../domain/DomainError'
import { checkRoom, receiveFile, tableLimit, type ReceivedFile, type UploadLimit } from '../domain/upload/receiveFile'

/** A sender that is silent for this long is cut off. */
const SILENCE_MS = 60_000

/**
 * Streams the request's body to `incoming/`: never in memory, never by `pipeline` (which would destroy the socket before an answer).
 * What is too large or finds no room is refused before it comes where its length is announced.
 */
export async function readUploadBody(event: H3Event, folder: string, limit: UploadLimit = tableLimit): Promise<ReceivedFile> {
  const { req } = event.node
  const announced = Number(getRequestHeader(event, 'content-length') ?? Number.NaN)
  const done = liftRequestTimeout(req.socket)
  try {
    await checkRoom(folder, Number.isFinite(announced) ? announced : null, limit)
    return await receiveFile(folder, req.iterator({ destroyOnReturn: false }), limit)
  }
  catch (error) {
    // The rest of the body is not wanted: the connection ends with the answer.
    setResponseHeader(event, 'connection', 'close')
    if (req.destroyed || (error instanceof Error && 'code' in error && error.code === 'ECONNRESET')) throw new DomainError('invalid', 'The upload was cut off. Nothing of it was kept; please send the file again.')
    throw error
  }
  finally {
    done()
  }
}

const uploading = new WeakMap<Server, { count: number, timeout: number }>()

/** Node gives a whole request five minutes, a slow line and large files need more: off while uploads run, and silence is watched instead. */
function liftRequestTimeout(socket: Socket): () => void {
  const server: unknown = Reflect.get(socket, 'server')
  socket.setTimeout(SILENCE_MS, () => socket.destroy())
  if (!(server instanceof Server)) return () => socket.setTimeout(0)
  const state = uploading.get(server) ?? { count: 0, timeout: server.requestTimeout }
  uploading.set(server, state)
  state.count++
  server.requestTimeout = 0
  return () => {
    socket.setTimeout(0)
    state.count--
    if (state.count === 0) {
      server.requestTimeout = state.timeout
      uploading.delete(server)
    }
  }
}
