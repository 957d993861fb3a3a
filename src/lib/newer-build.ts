const lastReloadKey = 'ridgehand.newer-build'
const leastGapMs = 60_000

/**
 * A page that was open while a newer build was put in place asks for files that are gone: it is loaded anew,
 * once a minute at most, so that a missing file does not load it for ever.
 */
export function reloadForNewerBuild(): void {
  window.addEventListener('vite:preloadError', (event) => {
    const last = Number(sessionStorage.getItem(lastReloadKey) ?? 0)
    if (Date.now() - last < leastGapMs) return
    sessionStorage.setItem(lastReloadKey, String(Date.now()))
    event.preventDefault()
    window.location.reload()
  })
}
