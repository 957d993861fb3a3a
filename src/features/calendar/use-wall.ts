import { useEffect } from 'react'

/**
 * Crew weeks over the whole screen, for one on the wall. Where the browser will not give the screen, they
 * fill the window.
 */
export function useWall(isWall: boolean, setWall: (on: boolean) => void) {
  useEffect(() => {
    if (!isWall) return
    const left = () => {
      if (!document.fullscreenElement) setWall(false)
    }
    const press = (event: KeyboardEvent) => {
      const isBusy = event.defaultPrevented || document.querySelector('[role="dialog"]')
      if (event.key === 'Escape' && !isBusy && !document.fullscreenElement) setWall(false)
    }
    document.addEventListener('fullscreenchange', left)
    document.addEventListener('keydown', press)
    return () => {
      document.removeEventListener('fullscreenchange', left)
      document.removeEventListener('keydown', press)
    }
  })
  useEffect(() => {
    if (!isWall) return
    document.documentElement.setAttribute('data-wall', 'on')
    return () => document.documentElement.removeAttribute('data-wall')
  }, [isWall])
  return (on: boolean) => {
    setWall(on)
    if (on) document.documentElement.requestFullscreen().catch(() => undefined)
    else if (document.fullscreenElement) void document.exitFullscreen()
  }
}
