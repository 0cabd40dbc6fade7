import type { H3Event } from 'h3'
import { ownAddress } from './environment'

/** The full address of a page of this server, for a person to hand on. */
export function linkTo(event: H3Event, path: string): string {
  return ownAddress(getRequestHeader(event, 'host')) + path
}
