import { CalendarPage } from '../features/calendar/calendar-page.tsx'
import { ClashLink } from '../features/clashes/clash-link.tsx'
import { NotToldLink } from '../features/notices/not-told-link.tsx'
import { RainOffBanner, RainOffLink } from '../features/rain-offs/rain-off-banner.tsx'

/** The calendar with what waits beside it: each part is a feature of its own, put together here. */
export function CalendarScreen() {
  return (
    <CalendarPage
      waiting={
        <>
          <ClashLink />
          <NotToldLink />
          <RainOffLink />
        </>
      }
      above={<RainOffBanner />}
    />
  )
}
