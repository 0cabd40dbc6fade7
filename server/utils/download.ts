import type { H3Event } from 'h3'

/** Headers of a file to be saved under its name, whatever letters it has (RFC 6266). */
export function setDownload(event: H3Event, name: string, type: string) {
  const plain = name.normalize('NFKD').replace(/[^\w .()-]/g, '_')
  setResponseHeaders(event, {
    'content-type': type,
    'content-disposition': `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(name).replace(/['()]/g, escape)}`,
    'x-content-type-options': 'nosniff',
  })
}
