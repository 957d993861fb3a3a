import { AskRainOffLink, RainOffAnswers } from '../features/rain-offs/today-rain-off.tsx'
import { TodayPage } from '../features/today/today-page.tsx'

/** The day sheet with what stands over and under it: each part is a feature of its own, put together here. */
export function TodayScreen() {
  return (
    <TodayPage
      head={(which) => <RainOffAnswers {...which} />}
      foot={(which) => <AskRainOffLink {...which} />}
    />
  )
}
