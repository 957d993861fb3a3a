import { TodayRainOff } from '../features/rain-offs/today-rain-off.tsx'
import { TodayPage } from '../features/today/today-page.tsx'

/** The day sheet with what stands at its foot: each part is a feature of its own, put together here. */
export function TodayScreen() {
  return <TodayPage foot={(which) => <TodayRainOff {...which} />} />
}
