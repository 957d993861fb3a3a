import type { ServedApp } from './browser.ts'
import { bookingIdOf, dayIdOf, jobIdOf, messageIdOf, taskIdOf } from './demo.ts'

export type Screen = { name: string; who: string | null; path: string }

/** Every screen, as whoever uses it; on the demo firm. */
export function screensOf({ db }: ServedApp, today: string): Screen[] {
  const house = jobIdOf(db, 'QR-108')
  const octagon = jobIdOf(db, 'QR-104')
  const splay = jobIdOf(db, 'QR-107')
  const todaysDay = dayIdOf(db, 'QR-108', today)
  const task = taskIdOf(db, 'wil@quillback.example', todaysDay)
  const signedOut = (name: string, path: string): Screen => ({ name, who: null, path })
  const office = (name: string, path: string): Screen => ({
    name: `office-${name}`,
    who: 'marnie',
    path,
  })
  const lead = (name: string, path: string): Screen => ({
    name: `leading-hand-${name}`,
    who: 'tamsin',
    path,
  })
  const apprentice = (name: string, path: string): Screen => ({
    name: `apprentice-${name}`,
    who: 'wil',
    path,
  })
  return [
    signedOut('sign-in', '/sign-in'),
    signedOut('reset', '/reset'),
    signedOut('set-password', '/set-password?token=0'),
    office('board', '/board'),
    office('board-search', '/board?q=nothing+like+this'),
    office('job', `/jobs/${house}`),
    office('job-edit', `/jobs/${house}/edit`),
    office('job-new', '/jobs/new'),
    office('roof-editor', `/jobs/${octagon}/roof`),
    office('roof-editor-empty', `/jobs/${jobIdOf(db, 'QR-101')}/roof`),
    office('revision-octagonal', `/jobs/${octagon}/revisions/A`),
    office('revision-splayed', `/jobs/${splay}/revisions/A`),
    office('revision-wings', `/jobs/${jobIdOf(db, 'QR-113')}/revisions/A`),
    office('revision-all-timbers', `/jobs/${jobIdOf(db, 'QR-112')}/revisions/A`),
    office('card-valley', `/jobs/${jobIdOf(db, 'QR-112')}/revisions/A?timber=V1a`),
    office('card-underpurlin', `/jobs/${jobIdOf(db, 'QR-112')}/revisions/A?timber=UP1`),
    office('calendar-month', '/calendar'),
    office('calendar-week', `/calendar?view=week&on=${today}`),
    office('booking', `/calendar/bookings/${bookingIdOf(db, 'QR-108')}`),
    office('book', `/calendar/book?job=${octagon}`),
    office('today', '/today'),
    office('messages', '/messages'),
    office('message', `/messages/${messageIdOf(db)}`),
    office('people', '/people'),
    office('person-new', '/people/new'),
    office('firm', '/firm'),
    office('account', '/account'),
    office('not-found', '/no-such-page'),
    lead('today', '/today'),
    lead('plates', `/today/plates/${todaysDay}`),
    lead('board', '/board'),
    lead('job', `/jobs/${house}`),
    lead('calendar', '/calendar'),
    lead('revision', `/jobs/${house}/revisions/A`),
    apprentice('my-tasks', '/my-tasks'),
    apprentice('task', `/my-tasks/${task}`),
    apprentice('today', '/today'),
  ]
}
