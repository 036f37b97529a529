const EVERY_MS = 3_000

/** Keeps the sign-in codes of the invented accounts on the mail catcher's page; they change every 30 seconds. */
export function keepCodesShown(env, demoCodes) {
  const show = async () => {
    try {
      await fetch(`http://localhost:${env.MAIL_HTTP_PORT}/notes`, {
        method: 'POST',
        headers: { 'Content-Type': 'application/json' },
        body: JSON.stringify(demoCodes()),
        signal: AbortSignal.timeout(2_000),
      })
    } catch {
      // The catcher is stopping or busy; the next round shows them.
    }
  }
  setInterval(show, EVERY_MS).unref()
  return show()
}
