import type { RouteObject } from 'react-router-dom'

/** Screens inside the shell, one lazy file each; `permission` of the first navigation entry guards none: the server does. */
export const shellRoutes: RouteObject[] = [
  {
    path: 'board',
    lazy: async () => ({ Component: (await import('../features/jobs/board-page.tsx')).BoardPage }),
  },
  {
    path: 'jobs/new',
    lazy: async () => ({
      Component: (await import('../features/jobs/new-job-page.tsx')).NewJobPage,
    }),
  },
  {
    path: 'jobs/:jobId',
    lazy: async () => ({ Component: (await import('../features/jobs/job-page.tsx')).JobPage }),
    children: [
      {
        path: 'edit',
        lazy: async () => ({
          Component: (await import('../features/jobs/job-edit-panel.tsx')).JobEditPanel,
        }),
      },
    ],
  },
  {
    path: 'messages',
    lazy: async () => ({
      Component: (await import('../features/messages/messages-page.tsx')).MessagesPage,
    }),
    children: [
      {
        path: ':messageId',
        lazy: async () => ({
          Component: (await import('../features/messages/message-panel.tsx')).MessagePanel,
        }),
      },
    ],
  },
  {
    path: 'calendar',
    lazy: async () => ({
      Component: (await import('./calendar-screen.tsx')).CalendarScreen,
    }),
    children: [
      {
        path: 'book',
        lazy: async () => ({
          Component: (await import('../features/calendar/book-panel.tsx')).BookPanel,
        }),
      },
      {
        path: 'clashes',
        lazy: async () => ({
          Component: (await import('../features/clashes/clash-panel.tsx')).ClashPanel,
        }),
      },
      {
        path: 'not-told',
        lazy: async () => ({
          Component: (await import('../features/notices/not-told-panel.tsx')).NotToldPanel,
        }),
      },
      {
        path: 'find-days',
        lazy: async () => ({
          Component: (await import('../features/find-days/find-days-panel.tsx')).FindDaysPanel,
        }),
      },
      {
        path: 'rain-off',
        lazy: async () => ({
          Component: (await import('../features/rain-offs/rain-off-panel.tsx')).RainOffPanel,
        }),
      },
      {
        path: 'bookings/:bookingId',
        lazy: async () => ({
          Component: (await import('../features/calendar/booking-panel.tsx')).BookingPanel,
        }),
      },
    ],
  },
  {
    path: 'account',
    lazy: async () => ({
      Component: (await import('../features/auth/account-page.tsx')).AccountPage,
    }),
  },
  {
    path: 'people',
    lazy: async () => ({
      Component: (await import('../features/people/people-page.tsx')).PeoplePage,
    }),
  },
  {
    path: 'people/:personId',
    lazy: async () => ({
      Component: (await import('../features/people/people-page.tsx')).PeoplePage,
    }),
  },
  {
    path: 'people/crews/:crewId',
    lazy: async () => ({
      Component: (await import('../features/people/people-page.tsx')).PeoplePage,
    }),
  },
  {
    path: 'firm',
    lazy: async () => ({ Component: (await import('../features/firm/firm-page.tsx')).FirmPage }),
  },
  {
    path: 'jobs/:jobId/roof',
    lazy: async () => ({
      Component: (await import('../features/roof-editor/roof-editor-page.tsx')).RoofEditorPage,
    }),
  },
  {
    path: 'jobs/:jobId/revisions/:letter',
    lazy: async () => ({
      Component: (await import('../features/roof-editor/revision-page.tsx')).RevisionPage,
    }),
  },
  {
    path: 'jobs/:jobId/revisions/:letter/against/:other',
    lazy: async () => ({
      Component: (await import('../features/roof-editor/comparison-page.tsx')).ComparisonPage,
    }),
  },
  {
    path: 'today',
    lazy: async () => ({
      Component: (await import('./today-screen.tsx')).TodayScreen,
    }),
  },
  {
    path: 'today/rain-off',
    lazy: async () => ({
      Component: (await import('../features/rain-offs/ask-rain-off-page.tsx')).AskRainOffPage,
    }),
  },
  {
    path: 'today/plates/:bookingDayId',
    lazy: async () => ({
      Component: (await import('../features/today/plate-check-page.tsx')).PlateCheckPage,
    }),
  },
  {
    path: 'jobs/:jobId/hours',
    lazy: async () => ({
      Component: (await import('../features/day-logs/job-hours-page.tsx')).JobHoursPage,
    }),
  },
  {
    path: 'jobs/:jobId/lost-time',
    lazy: async () => ({
      Component: (await import('../features/day-logs/lost-time-page.tsx')).LostTimePage,
    }),
  },
  {
    path: 'hours',
    lazy: async () => ({
      Component: (await import('../features/day-logs/week-hours-page.tsx')).WeekHoursPage,
    }),
  },
  {
    path: 'today/close/:bookingDayId',
    lazy: async () => ({
      Component: (await import('../features/day-logs/close-day-page.tsx')).CloseDayPage,
    }),
  },
  {
    path: 'my-tasks',
    lazy: async () => ({
      Component: (await import('../features/my-tasks/my-tasks-page.tsx')).MyTasksPage,
    }),
  },
  {
    path: 'my-tasks/:taskId',
    lazy: async () => ({
      Component: (await import('../features/my-tasks/task-page.tsx')).TaskPage,
    }),
  },
]
