import type {
  DayLog,
  DayToClose,
  ExpectedPerson,
  WriteDayLog,
} from '../../../shared/day-logs/day-log-schemas.ts'

/** What a log says, as the form changes it. */
export function asWritten(log: DayLog, day: string): WriteDayLog {
  const { version, done, remarks, people, delays } = log
  return {
    version,
    day,
    done,
    remarks,
    people: people.map(({ personId, turnedUp, minutes }) => ({ personId, turnedUp, minutes })),
    delays,
  }
}

/** The day as it was meant to go: everybody not on leave, with their ordinary hours. */
function asExpected(day: DayToClose): WriteDayLog {
  return {
    version: 0,
    day: day.day,
    done: '',
    remarks: '',
    people: day.roster.map(({ personId, onLeave, minutes }) => ({
      personId,
      turnedUp: !onLeave,
      minutes: onLeave ? 0 : minutes,
    })),
    delays: [],
  }
}

export function logToStart(day: DayToClose): WriteDayLog {
  return day.log ? asWritten(day.log, day.day) : asExpected(day)
}

/** Everybody that can stand in the log, by id: rostered, logged already, or to be added by the office. */
export function peopleOf(day: DayToClose): Map<string, ExpectedPerson> {
  const logged = (day.log?.people ?? []).map(({ personId, name, minutes }) => ({
    personId,
    name,
    minutes,
    onLeave: false,
  }))
  return new Map([...logged, ...day.others, ...day.roster].map((one) => [one.personId, one]))
}
