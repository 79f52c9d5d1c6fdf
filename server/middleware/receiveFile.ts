import type { RequestHandler } from 'express'
import multer, { MulterError } from 'multer'
import { Refusal, unusable } from '@/server/errors'

/**
 * Reads one uploaded file, in the part `file` of a multipart body, into memory.
 *
 * @param largestBytes a larger file is refused while it comes in
 */
export function receiveFile(largestBytes: number, tooLarge: () => Refusal): RequestHandler {
  const receive = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: largestBytes, files: 1, fields: 5, fieldSize: 1_000, parts: 6, headerPairs: 50 },
    defParamCharset: 'utf8',
  }).single('file')
  return (request, response, next) => {
    receive(request, response, (error: unknown) => {
      if (error instanceof MulterError) return next(error.code === 'LIMIT_FILE_SIZE' ? tooLarge() : noFile())
      if (error) return next(notMultipart())
      next(request.file === undefined ? noFile() : undefined)
    })
  }
}

const noFile = () =>
  unusable('No file came with the request. Nothing was changed; choose one file and send it again.', [
    { pointer: '/body/file', code: 'file-missing', detail: 'one part named "file" is expected' },
  ])
const notMultipart = () =>
  new Refusal(400, 'body-not-readable', 'The upload broke off or is not a form. Nothing was changed; send it again.')
