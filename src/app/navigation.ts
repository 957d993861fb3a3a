import {
  Building2,
  CalendarDays,
  ClipboardList,
  Clock,
  HardHat,
  LayoutGrid,
  type LucideIcon,
  Mail,
  Users,
} from 'lucide-react'
import type { Role } from '../../shared/auth/roles.ts'

export type NavigationEntry = { to: string; label: string; icon: LucideIcon }

const board = { to: '/board', label: 'Board', icon: LayoutGrid }
const calendar = { to: '/calendar', label: 'Calendar', icon: CalendarDays }
const today = { to: '/today', label: 'Today', icon: HardHat }
const myTasks = { to: '/my-tasks', label: 'My tasks', icon: ClipboardList }
const messages = { to: '/messages', label: 'Messages', icon: Mail }
const hours = { to: '/hours', label: 'Hours', icon: Clock }
const people = { to: '/people', label: 'People', icon: Users }
const firm = { to: '/firm', label: 'Firm', icon: Building2 }

/** In order of use; a phone shows the first three and *More*. */
export const navigationOf: Record<Role, NavigationEntry[]> = {
  office: [board, calendar, today, messages, hours, people, firm],
  'leading-hand': [today, calendar, board],
  apprentice: [myTasks, today],
}
