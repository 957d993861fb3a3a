import { Navigate } from 'react-router-dom'
import type { Role } from '../../shared/auth/roles.ts'
import { useUser } from '../lib/session.ts'

const homes: Record<Role, string> = {
  office: '/board',
  'leading-hand': '/today',
  apprentice: '/my-tasks',
}

/** Where each role's day begins. */
export function Home() {
  return <Navigate to={homes[useUser().role]} replace />
}
