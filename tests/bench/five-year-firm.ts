import type { Database } from 'better-sqlite3'
import { type Day, dayPlus, isoWeekday } from '../../shared/calendar/days.ts'

export type HistorySize = { jobs: number; bookings: number; tasks: number; crews: number }

/** Five years of a busy firm, as the office's issue counts it. */
export const fiveYears: HistorySize = { jobs: 10_000, bookings: 60_000, tasks: 500_000, crews: 24 }

const years = 5
const packageOrder = ['set-out-plates', 'cut-commons', 'ridge', 'hips', 'creepers', 'tails']

function workedDaysBefore(today: Day): Day[] {
  const days: Day[] = []
  for (let back = 1; back < years * 365; back++) {
    const day = dayPlus(today, -back)
    if (isoWeekday(day) <= 5) days.push(day)
  }
  return days.reverse()
}

/**
 * Writes years of work done into a database that has a firm of its own: jobs marked complete, each with its
 * bookings, days, tasks and ticks, by crews that are not there any more. What is on now stays what it was.
 */
export function addHistory(
  sqlite: Database,
  size: HistorySize,
  from: { today: Day; now: Date },
): void {
  const days = workedDaysBefore(from.today)
  const now = from.now.getTime()
  const personId = (sqlite.prepare('select id from people limit 1').get() as { id: string }).id
  const put = {
    crew: sqlite.prepare(
      'insert into crews (id, name, letter, colour, active) values (?, ?, ?, ?, 0)',
    ),
    job: sqlite.prepare(
      `insert into jobs (id, number, title, site_address, customer_name, covering, price_cents,
        price_sent_on, accepted_on, completed_on, created_at, updated_at)
       values (?, ?, ?, ?, ?, 'tiles', ?, ?, ?, ?, ?, ?)`,
    ),
    booking: sqlite.prepare(
      `insert into bookings (id, job_id, crew_id, state, uid, created_at, updated_at)
       values (?, ?, ?, 'firm', ?, ?, ?)`,
    ),
    day: sqlite.prepare('insert into booking_days (id, booking_id, day) values (?, ?, ?)'),
    task: sqlite.prepare(
      `insert into tasks (id, booking_day_id, position, package_key, work, cut_line_mark, member_marks,
        title, quantity, planned_minutes) values (?, ?, ?, ?, 'cut', ?, '[]', ?, 4, 60)`,
    ),
    tick: sqlite.prepare(
      'insert into ticks (id, task_id, person_id, delta, at) values (?, ?, ?, 4, ?)',
    ),
  }
  sqlite.transaction(() => {
    for (let c = 0; c < size.crews; c++)
      put.crew.run(`h-crew-${c}`, `Past crew ${c + 1}`, 'X', (c % 6) + 1)
    for (let j = 0; j < size.jobs; j++) {
      const done = days[Math.floor(((j + 1) / size.jobs) * (days.length - 1))] ?? from.today
      put.job.run(
        `h-job-${j}`,
        `H-${j}`,
        `House ${j}`,
        `${(j % 300) + 1} Past Road, Marrow Creek`,
        `Customer ${j % 900}`,
        1_500_000 + j,
        done,
        done,
        done,
        now,
        now,
      )
    }
    for (let b = 0; b < size.bookings; b++) {
      const at = Math.floor((b / size.bookings) * (days.length - 2))
      put.booking.run(
        `h-booking-${b}`,
        `h-job-${Math.floor((b / size.bookings) * size.jobs)}`,
        `h-crew-${b % size.crews}`,
        `h-booking-${b}`,
        now,
        now,
      )
      put.day.run(`h-day-${b}`, `h-booking-${b}`, days[at])
    }
    for (let t = 0; t < size.tasks; t++) {
      const b = Math.floor((t / size.tasks) * size.bookings)
      const key = packageOrder[t % packageOrder.length]
      put.task.run(`h-task-${t}`, `h-day-${b}`, t % 9, key, `C${t % 40}`, `Cut C${t % 40}`)
      put.tick.run(`h-tick-${t}`, `h-task-${t}`, personId, now)
    }
  })()
}
