declare module '#auth-utils' {
  interface User { id: string }
  /** Sealed in the cookie, never sent to the page's scripts. */
  interface SecureSessionData { sid: string }
}

export {}
