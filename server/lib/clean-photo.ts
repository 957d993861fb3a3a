import { fileTypeFromBuffer } from 'file-type'
import sharp from 'sharp'
import { photoField, photoTypes } from '../../shared/http/upload.ts'
import { invalidField } from '../http/app-error.ts'

/** More than any phone's camera takes; a small file that unpacks to more is refused unopened. */
const mostPixels = 64_000_000
const longestSidePx = 1600
const longestSeconds = 15

const taken: readonly string[] = photoTypes
const refuse = (message: string) => invalidField(photoField, message)

/**
 * A picture sent from outside, made anew: turned upright, at most 1600 px on its longer side, JPEG, with
 * nothing in it but the picture (no place, no maker, no remarks).
 *
 * @throws AppError 400 when the content is no JPEG, PNG or WebP picture, is too large, or cannot be read.
 */
export async function cleanPhoto(sent: Buffer): Promise<{ contentType: string; bytes: Buffer }> {
  const type = await fileTypeFromBuffer(sent).catch(() => undefined)
  if (!type || !taken.includes(type.mime))
    throw refuse('That is no photo we can read. Send a JPEG, PNG or WebP picture.')
  const unread = 'That picture could not be read. Take it again and send it.'
  const { width, height, format } = await sharp(sent, { limitInputPixels: false })
    .metadata()
    .catch(() => {
      throw refuse(unread)
    })
  if (`image/${format}` !== type.mime) throw refuse(unread)
  if (width * height > mostPixels)
    throw refuse('That picture has too many pixels. Take it again smaller.')
  const bytes = await sharp(sent, { limitInputPixels: mostPixels, failOn: 'error' })
    .timeout({ seconds: longestSeconds })
    .autoOrient()
    .resize({
      width: longestSidePx,
      height: longestSidePx,
      fit: 'inside',
      withoutEnlargement: true,
    })
    .flatten({ background: '#ffffff' })
    .jpeg({ quality: 82 })
    .toBuffer()
    .catch(() => {
      throw refuse(unread)
    })
  return { contentType: 'image/jpeg', bytes }
}
