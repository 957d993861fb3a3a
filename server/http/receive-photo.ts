import type { Request, RequestHandler } from 'express'
import multer from 'multer'
import { photoField, photoMaxBytes } from '../../shared/http/upload.ts'
import { AppError, invalidField } from './app-error.ts'

const mb = 1024 * 1024

function refusal(error: unknown): AppError {
  const tooLarge = error instanceof multer.MulterError && error.code === 'LIMIT_FILE_SIZE'
  return tooLarge
    ? invalidField(photoField, `That picture is over ${photoMaxBytes / mb} MB. Send a smaller one.`)
    : new AppError('invalid_input', 'The picture did not arrive whole. Try again.')
}

/** Takes one picture into memory, no larger than agreed and nothing beside it. */
export function receivePhoto(): RequestHandler {
  const take = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: photoMaxBytes, files: 1, fields: 0, parts: 1 },
  }).single(photoField)
  return (req, res, next) => {
    void take(req, res, (error: unknown) => {
      if (error) next(refusal(error))
      else next()
    })
  }
}

/** @throws AppError 400 when no picture was sent. */
export function photoOf(req: Request): Buffer {
  if (!req.file || req.file.size === 0) throw invalidField(photoField, 'Choose a photo.')
  return req.file.buffer
}
