import { addressWithoutSecret, secretInAddress } from '../utils/secretAddress'

/**
 * Nitro logs an unforeseen error with the address asked. Where that holds a secret, this writes the log line without it
 * instead, and marks the error as seen. Runs before Nitro's own error handler.
 */
export default defineNitroPlugin((nitro) => {
  nitro.hooks.hook('error', (error, { event }) => {
    const secret = event && secretInAddress(event.path)
    if (!event || !secret || !isError(error) || !(error.unhandled || error.fatal)) return
    const said = (error.stack ?? error.message).replaceAll(secret, '…')
    console.error(`[${String(event.context.requestId)}] ${event.method} ${addressWithoutSecret(event.path)} ${said}`)
    if (error.unhandled) error.message = 'Something went wrong here. Nothing was changed.'
    error.unhandled = false
    error.fatal = false
  })
})
