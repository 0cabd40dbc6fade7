/** Addresses that hold a secret: shared pages, invitations, and their API. Pages are found whatever the case of their address. */
const SECRET_ADDRESS = /^\/(?:api\/)?(shared|invitations|invitation)\/([^/?#]+)/i

/** The secret an address holds; undefined for every other address. */
export function secretInAddress(path: string): string | undefined {
  return SECRET_ADDRESS.exec(path)?.[2]
}

/** An address as a log may hold it. */
export function addressWithoutSecret(path: string): string {
  const secret = secretInAddress(path)
  return (secret === undefined ? path : path.replace(secret, '…')).split('?')[0] ?? ''
}
