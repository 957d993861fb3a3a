import { eq } from 'drizzle-orm'
import { expect, test } from 'vitest'
import { firm } from '../../server/db/tables/firm-tables.ts'
import { people } from '../../server/db/tables/people-tables.ts'
import { enqueueMail } from '../../server/mail/outbox-store.ts'
import { createMailYard } from './support/mail-yard.ts'

const secondHeader = 'Rook\r\nBcc: all@elsewhere.example\r\n\r\nOther words'

test('a name or a title with line breaks adds no header and no receiver', async () => {
  const yard = await createMailYard()
  const odd = yard.addJob({ title: secondHeader, siteAddress: secondHeader })
  yard.db.update(people).set({ name: secondHeader }).run()
  yard.db.update(firm).set({ name: secondHeader }).where(eq(firm.id, 1)).run()
  yard.book(['2026-12-03'], { jobId: odd })
  enqueueMail(yard.db, {
    key: 'invitation:odd',
    kind: 'invitation',
    personId: yard.lead.id,
    toName: secondHeader,
    toEmail: yard.lead.email,
    payload: {},
    now: yard.clock.current,
  })
  yard.at('2026-12-02T06:00:00Z')
  await yard.worker().runOnce()
  expect(yard.fake.sent.length).toBeGreaterThan(1)
  for (const mail of yard.fake.sent) {
    const [head = ''] = mail.raw.split('\r\n\r\n')
    expect(head).not.toMatch(/^bcc:/im)
    expect(mail.to).toMatch(/^[a-z.]+@quillback\.example$/)
    expect(head.match(/^Subject:/gm)).toHaveLength(1)
  }
})

test('what is typed anywhere is words in the HTML part, never markup or a link of its own', async () => {
  const yard = await createMailYard()
  const markup = `<img src=x onerror="alert(1)"><a href='javascript:alert(1)'>x</a>`
  const odd = yard.addJob({
    title: markup,
    siteAddress: markup,
    accessNotes: markup,
    siteContactName: markup,
    crewNotes: markup,
  })
  yard.db.update(people).set({ name: markup }).run()
  yard.db.update(firm).set({ name: markup, phone: markup }).where(eq(firm.id, 1)).run()
  yard.book(['2026-12-03'], { jobId: odd, gear: markup })
  yard.at('2026-12-02T06:00:00Z')
  await yard.worker().runOnce()
  expect(yard.fake.sent.length).toBeGreaterThan(1)
  for (const { html } of yard.fake.sent) {
    expect(html).toContain('&lt;img')
    expect(html).not.toMatch(/<img|<script|<iframe|\son\w+="/i)
    const links = [...html.matchAll(/<a [^>]*href="([^"]*)"/g)].map((found) => found[1])
    expect(links.every((link) => link?.startsWith(`${yard.env.appUrl}/`))).toBe(true)
  }
})
