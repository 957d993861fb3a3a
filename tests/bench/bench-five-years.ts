import { eq } from 'drizzle-orm'
import type { Agent, TestApp } from '../api/harness.ts'
import { createTestApp } from '../api/harness.ts'
import { demoPassword } from '../../server/db/demo/demo-people.ts'
import { seedDemo } from '../../server/db/demo/seed-demo.ts'
import { jobs } from '../../server/db/tables/job-tables.ts'
import { localDayOf } from '../../shared/calendar/local-time.ts'
import { dayPlus, isoWeekday } from '../../shared/calendar/days.ts'
import { addHistory, fiveYears } from './five-year-firm.ts'
import { median, takenMs } from './timing.ts'

type Firm = { app: TestApp; office: Agent; lead: Agent; wonJobId: string }

async function signedIn(app: TestApp, key: string): Promise<Agent> {
  const agent = await app.agentFor()
  const email = `${key}@quillback.example`
  await agent.post('/api/session').send({ email, password: demoPassword }).expect(201)
  return agent
}

async function demoFirm(withHistory: boolean): Promise<Firm> {
  const app = await createTestApp()
  await seedDemo(app.db, app.clock)
  const today = localDayOf(app.clock.now(), 'Australia/Brisbane')
  if (withHistory) {
    addHistory(app.database.sqlite, fiveYears, { today, now: app.clock.now() })
  }
  const won = app.db.select({ id: jobs.id }).from(jobs).where(eq(jobs.number, 'QR-104')).get()
  return {
    app,
    office: await signedIn(app, 'marnie'),
    lead: await signedIn(app, 'tamsin'),
    wonJobId: won?.id ?? '',
  }
}

type Screen = { name: string; path: (firm: Firm) => string; who: 'office' | 'lead' }

function screensOf(today: string): Screen[] {
  const monday = dayPlus(today, 1 - isoWeekday(today))
  const span = (days: number) => `from=${monday}&to=${dayPlus(monday, days - 1)}`
  return [
    { name: 'month view', who: 'office', path: () => `/api/calendar?${span(42)}` },
    { name: 'crew weeks', who: 'office', path: () => `/api/calendar?${span(35)}` },
    {
      name: 'find days',
      who: 'office',
      path: (firm) => `/api/jobs/${firm.wonJobId}/openings`,
    },
    { name: 'board', who: 'office', path: () => '/api/jobs' },
    { name: 'Today', who: 'lead', path: () => `/api/day-sheets?day=${today}` },
    { name: 'clashes', who: 'office', path: () => '/api/clashes' },
    { name: 'not yet told', who: 'office', path: () => '/api/notices' },
  ]
}

async function onceMs(firm: Firm, screen: Screen): Promise<number> {
  const began = takenMs()
  const answer = await firm[screen.who].get(screen.path(firm))
  const took = takenMs() - began
  if (answer.status !== 200) throw new Error(`${screen.name}: ${answer.status} ${answer.text}`)
  return took
}

const rounds = 40
const warmUps = 8

/** What years of history cost the screens of today: the demo firm with and without them, turn about. */
export async function benchFiveYears(): Promise<void> {
  const began = takenMs()
  const bare = await demoFirm(false)
  const old = await demoFirm(true)
  const today = localDayOf(bare.app.clock.now(), 'Australia/Brisbane')
  console.log(
    `\nFive years: ${fiveYears.jobs} jobs, ${fiveYears.bookings} bookings, ${fiveYears.tasks} tasks behind the demo firm; both seeded in ${((takenMs() - began) / 1000).toFixed(1)} processor seconds`,
  )
  console.log('  median processor ms of a request   demo   five years   ratio')
  for (const screen of screensOf(today)) {
    const times = { bare: [] as number[], old: [] as number[] }
    for (let i = 0; i < rounds + warmUps; i++) {
      const [ofBare, ofOld] = [await onceMs(bare, screen), await onceMs(old, screen)]
      if (i < warmUps) continue
      times.bare.push(ofBare)
      times.old.push(ofOld)
    }
    const [bareMs, oldMs] = [median(times.bare), median(times.old)]
    const ratio = oldMs / bareMs
    console.log(
      `  ${screen.name.padEnd(32)} ${bareMs.toFixed(1).padStart(7)} ${oldMs.toFixed(1).padStart(12)}   × ${ratio.toFixed(2)}${ratio <= 2 ? '' : ', over twice'}`,
    )
  }
  bare.app.close()
  old.app.close()
}
