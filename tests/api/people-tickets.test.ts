import { randomBytes } from 'node:crypto'
import { deflateSync, crc32 } from 'node:zlib'
import sharp from 'sharp'
import { expect, test } from 'vitest'
import { ticketPhotos, tickets } from '../../server/db/tables/people-tables.ts'
import { photoMaxBytes, uploadHeader } from '../../shared/http/upload.ts'
import type { Ticket } from '../../shared/people/ticket-schemas.ts'
import type { Agent } from './harness.ts'
import { missingId, twoCrewFirm } from './people-kit.ts'

const heights = {
  kind: 'working-at-heights',
  name: '',
  number: 'WAH 4471',
  expiresOn: '2027-02-11',
}

/** A firm whose leading hand holds one ticket. */
async function ticketed() {
  const firm = await twoCrewFirm()
  const { agent, lead } = firm
  const { body } = await agent.post(`/api/people/${lead.id}/tickets`).send(heights).expect(201)
  const ticket = body as Ticket
  return { ...firm, ticket, path: `/api/people/${lead.id}/tickets/${ticket.id}` }
}

const put = (agent: Agent, path: string, bytes: Buffer, name = 'card.jpg') =>
  agent.put(`${path}/photo`).set(uploadHeader, '1').attach('photo', bytes, name)

const plain = (width: number, height: number) =>
  sharp({ create: { width, height, channels: 3, background: '#b08040' } })

test('a ticket is kept with its number and last day, and changed only from what is there now', async () => {
  const { agent, lead, ticket, path } = await ticketed()
  expect(ticket).toMatchObject({ ...heights, photoAt: null, version: 1 })
  const renewed = { ...heights, expiresOn: '2029-02-11' }
  await agent
    .put(path)
    .send({ ...renewed, version: 1 })
    .expect(200)
  const stale = await agent
    .put(path)
    .send({ ...heights, version: 1 })
    .expect(409)
  expect(stale.body.detail.current).toMatchObject({ expiresOn: '2029-02-11', version: 2 })
  const { body } = await agent.get(`/api/people/${lead.id}`).expect(200)
  expect(body.tickets).toEqual([{ ...ticket, ...renewed, version: 2 }])
})

test('a ticket of another kind says what it is for', async () => {
  const { agent, lead } = await ticketed()
  const send = (values: object) =>
    agent.post(`/api/people/${lead.id}/tickets`).send({ ...heights, ...values })
  expect((await send({ kind: 'other' }).expect(400)).body.issues[0].path).toBe('name')
  await send({ kind: 'other', name: 'Forklift' }).expect(201)
  expect((await send({ kind: 'diving' }).expect(400)).body.issues[0].path).toBe('kind')
})

test('a ticket is found only under the person whose it is', async () => {
  const { app, agent, apprentice, ticket } = await ticketed()
  const wrong = `/api/people/${apprentice.id}/tickets/${ticket.id}`
  await agent
    .put(wrong)
    .send({ ...heights, version: 1 })
    .expect(404)
  await put(agent, wrong, await plain(40, 40).jpeg().toBuffer()).expect(404)
  await agent.delete(wrong).expect(404)
  await agent.post(`/api/people/${missingId}/tickets`).send(heights).expect(404)
  expect(app.db.select().from(tickets).all()).toHaveLength(1)
})

test('a photo is turned upright, made smaller and stripped of where and with what it was taken', async () => {
  const { app, agent, path } = await ticketed()
  const sent = await plain(3000, 2000)
    .withExif({ IFD0: { Make: 'Marrow cameras' }, IFD3: { GPSLatitudeRef: 'S' } })
    .withMetadata({ orientation: 6 })
    .jpeg()
    .toBuffer()
  expect((await sharp(sent).metadata()).exif).toBeDefined()
  const { body } = await put(agent, path, sent).expect(200)
  expect(body.photoAt).toBe(app.clock.current.toISOString())
  const shown = await agent.get(`${path}/photo`).expect(200)
  expect(shown.headers).toMatchObject({
    'content-type': 'image/jpeg',
    'x-content-type-options': 'nosniff',
    'cache-control': 'no-store',
  })
  const kept = await sharp(shown.body as Buffer).metadata()
  expect(kept).toMatchObject({ format: 'jpeg', width: 1067, height: 1600 })
  expect([kept.exif, kept.xmp, kept.iptc, kept.icc, kept.orientation]).toEqual(
    Array(5).fill(undefined),
  )
})

test.each(['png', 'webp'] as const)('a %s picture becomes a JPEG', async (format) => {
  const { agent, path } = await ticketed()
  await put(agent, path, await plain(90, 60)[format]().toBuffer(), 'x.bin').expect(200)
  const shown = await agent.get(`${path}/photo`).expect(200)
  expect((await sharp(shown.body as Buffer).metadata()).format).toBe('jpeg')
})

function pngChunk(type: string, data: Buffer): Buffer {
  const body = Buffer.concat([Buffer.from(type, 'latin1'), data])
  const out = Buffer.alloc(body.length + 8)
  out.writeUInt32BE(data.length, 0)
  body.copy(out, 4)
  out.writeUInt32BE(crc32(body), body.length + 4)
  return out
}

/** A grey PNG of under 100 kB that unpacks to 81 megapixels (PNG, W3C, clauses 5.2 and 11.2). */
function unpacksLarge(): Buffer {
  const side = 9_000
  const header = Buffer.alloc(13)
  header.writeUInt32BE(side, 0)
  header.writeUInt32BE(side, 4)
  header.writeUInt8(8, 8)
  return Buffer.concat([
    Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]),
    pngChunk('IHDR', header),
    pngChunk('IDAT', deflateSync(Buffer.alloc((side + 1) * side))),
    pngChunk('IEND', Buffer.alloc(0)),
  ])
}

test('what is no photo is refused by its content whatever it is called, and so is what unpacks too large', async () => {
  const { app, agent, path } = await ticketed()
  const jpeg = await sharp(randomBytes(300 * 200 * 3), {
    raw: { width: 300, height: 200, channels: 3 },
  })
    .jpeg()
    .toBuffer()
  const refused: Record<string, Buffer> = {
    svg: Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>'),
    'xml and svg': Buffer.from('<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg"/>'),
    html: Buffer.from('<!doctype html><script>alert(1)</script>'),
    gif: await plain(20, 20).gif().toBuffer(),
    tiff: await plain(20, 20).tiff().toBuffer(),
    'half a photo': jpeg.subarray(0, jpeg.length / 2),
    'the head of a photo and nothing more': jpeg.subarray(0, 64),
    'eighty megapixels': unpacksLarge(),
    nothing: Buffer.alloc(0),
  }
  const answers: Record<string, unknown> = {}
  for (const [what, bytes] of Object.entries(refused)) {
    const answer = await put(agent, path, bytes)
    answers[what] = [answer.status, answer.body.issues[0]?.path]
  }
  expect(answers).toEqual(
    Object.fromEntries(Object.keys(refused).map((what) => [what, [400, 'photo']])),
  )
  const { body } = await put(agent, path, unpacksLarge())
  expect(body.issues[0].message).toMatch(/too many pixels/)
  expect(unpacksLarge().length).toBeLessThan(100_000)
  expect(app.db.select().from(ticketPhotos).all()).toEqual([])
})

test('a file over the size, two files, or fields beside the photo are refused', async () => {
  const { app, agent, path } = await ticketed()
  const small = await plain(20, 20).jpeg().toBuffer()
  const large = Buffer.concat([small, Buffer.alloc(photoMaxBytes)])
  const answer = await put(agent, path, large).expect(400)
  expect(answer.body.issues).toEqual([
    { path: 'photo', message: 'That picture is over 12 MB. Send a smaller one.' },
  ])
  await put(agent, path, small).attach('photo', small, 'second.jpg').expect(400)
  await put(agent, path, small).field('personId', missingId).expect(400)
  await agent.put(`${path}/photo`).set(uploadHeader, '1').attach('card', small, 'x.jpg').expect(400)
  expect(app.db.select().from(ticketPhotos).all()).toEqual([])
})

test('an upload without its own header is refused, since a form of another site can send one', async () => {
  const { agent, path } = await ticketed()
  const small = await plain(20, 20).jpeg().toBuffer()
  await agent.put(`${path}/photo`).attach('photo', small, 'x.jpg').expect(400)
  await put(agent, path, small).set('sec-fetch-site', 'cross-site').expect(403)
})

test('everybody sees the own tickets and card, and nobody else’s', async () => {
  const { app, agent, lead, apprentice, ticket, path } = await ticketed()
  await put(agent, path, await plain(60, 40).jpeg().toBuffer()).expect(200)
  const photo = `/api/account/tickets/${ticket.id}/photo`
  const theirs = await app.agentFor(lead.email)
  const { body } = await theirs.get('/api/account/tickets').expect(200)
  expect(body.tickets).toMatchObject([{ id: ticket.id, number: 'WAH 4471' }])
  await theirs.get(photo).expect(200)
  const colleague = await app.agentFor(apprentice.email)
  expect((await colleague.get('/api/account/tickets').expect(200)).body.tickets).toEqual([])
  await colleague.get(photo).expect(404)
  await colleague.get(`${path}/photo`).expect(403)
  await theirs.get(`${path}/photo`).expect(403)
  await agent.get(photo).expect(404)
  const stranger = await app.agentFor()
  await stranger.get(photo).expect(401)
})

test('a ticket that is removed takes its photo with it; a photo can go alone', async () => {
  const { app, agent, path } = await ticketed()
  const photo = await plain(60, 40).jpeg().toBuffer()
  await put(agent, path, photo).expect(200)
  expect((await agent.delete(`${path}/photo`).expect(200)).body.photoAt).toBeNull()
  await agent.get(`${path}/photo`).expect(404)
  await agent.delete(`${path}/photo`).expect(404)
  await put(agent, path, photo).expect(200)
  await agent.delete(path).expect(200)
  expect(app.db.select().from(ticketPhotos).all()).toEqual([])
  await agent.delete(path).expect(404)
})
