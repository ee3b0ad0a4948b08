import { mkdir, readdir, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import type { Request, RequestHandler } from 'express';
import multer from 'multer';
import { photoLimits } from '../../shared/contract/photos.js';
import { FieldNotValid, ProblemError } from '../http/problems.js';

/** Age from which a file in the folder of uploads can only be a leftover of a process that was ended. */
const leftoverAfterMs = 60 * 60 * 1000;

/**
 * Takes one file of at most 20 MB in the field `file` to a temporary folder, and removes it when the exchange is over,
 * however it ends.
 */
export function acceptOnePhoto(folder: string): RequestHandler[] {
  const storage = multer.diskStorage({
    destination(_request, _file, done) {
      prepare(folder).then(
        () => done(null, folder),
        (error: Error) => done(error, folder),
      );
    },
  });
  const receive = multer({
    storage,
    limits: {
      fileSize: photoLimits.bytes,
      files: 1,
      fields: 4,
      parts: 5,
      fieldSize: 4096,
      fieldNameSize: 100,
      headerPairs: 20,
    },
  }).single('file');

  return [
    demandForm,
    (request, response, next) => {
      response.once('close', () => {
        // The receiver takes the path off a file that it has removed itself.
        const place: string | undefined = request.file?.path;
        if (place)
          rm(place, { force: true }).catch((error: unknown) =>
            request.log.warn({ err: error }, 'upload left behind'),
          );
      });
      receive(request, response, (error: unknown) => next(brokeOff(error) ?? error));
    },
  ];
}

/** Where the file of this request lies. Throws FieldNotValid where none was sent. */
export function uploadedFile(request: Request): string {
  if (!request.file) throw new FieldNotValid('file', 'is needed', 'Send one photo in the field named file.');
  return request.file.path;
}

const demandForm: RequestHandler = (request, _response, next) => {
  if (request.is('multipart/form-data') !== 'multipart/form-data') {
    throw new ProblemError(
      'media-type-not-taken',
      415,
      'This address takes form data only.',
      'Send the photo as multipart/form-data.',
    );
  }
  next();
};

/** A sender who has gone is nothing the log should call an error. */
function brokeOff(error: unknown): ProblemError | undefined {
  if (!(error instanceof Error) || !/^Request (?:aborted|closed)$/.test(error.message)) return undefined;
  return new ProblemError('not-valid', 400, 'The form data broke off.', 'Send the photo again.');
}

async function prepare(folder: string): Promise<void> {
  await mkdir(folder, { recursive: true });
  const oldest = Date.now() - leftoverAfterMs;
  await Promise.all(
    (await readdir(folder)).map(async (name) => {
      const place = path.join(folder, name);
      const age = await stat(place).catch(() => undefined);
      if (age && age.mtimeMs < oldest) await rm(place, { force: true });
    }),
  );
}
