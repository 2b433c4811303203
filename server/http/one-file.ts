import { mkdirSync } from 'node:fs';
import { tmpdir } from 'node:os';
import type { RequestHandler } from 'express';
import multer from 'multer';
import { AppError, invalidRequest } from '../errors';

/** Takes one file of a form from the field `file` to the disk, into a folder; whoever handles the request removes it. */
export function oneFile(mostMb: number, folder: string = tmpdir()): RequestHandler {
  mkdirSync(folder, { recursive: true });
  const take = multer({ dest: folder, limits: { fileSize: mostMb * 1024 * 1024, files: 1, fields: 4, fieldSize: 4096 } }).single('file');
  return (req, res, next) => {
    void take(req, res, (error: unknown) => {
      if (error instanceof multer.MulterError) {
        next(error.code === 'LIMIT_FILE_SIZE' ? new AppError('too_large', `The file is larger than ${mostMb} MB.`) : invalidRequest('Send one file, in the field “file”.'));
        return;
      }
      next(error);
    });
  };
}
