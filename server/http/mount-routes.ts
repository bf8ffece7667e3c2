import express, { type Express, type Request, type RequestHandler, type Response } from 'express';
import multer from 'multer';

import { permit } from '#shared/domain/permissions.ts';
import { AppError } from '#shared/errors/app-error.ts';

import { signedInOf } from './authentication.ts';
import { demandCsrfToken } from './csrf.ts';
import { FileReply } from './file-reply.ts';
import type { Guard, Route } from './route.ts';
import type { SignedIn } from './signed-in.ts';

/** Largest JSON body; the longest item that its own limits allow is shorter in practice. */
const JSON_LIMIT = '2mb';

/** Sign-in first, then the page's token, then the role: each refusal says the most useful thing. */
function admit(guard: Guard, request: Request): SignedIn | null {
  const actor = signedInOf(request);
  if (guard.can !== 'anyone' && actor === null) {
    throw new AppError('notSignedIn', 'Your session has ended. Sign in again; what you typed is still here.');
  }
  demandCsrfToken(request);
  if (guard.can !== 'anyone' && guard.can !== 'signedIn' && actor !== null) {
    // Ownership is asked by the service, with the row at hand; without a subject only roles decide.
    const verdict = permit({ id: actor.id, roles: actor.roles }, guard.can);
    if (!verdict.allowed) throw new AppError('notAllowed', verdict.reason);
  }
  return actor;
}

function bodyReader(guard: Guard): RequestHandler {
  if (guard.uploadBytes === undefined) {
    const json = express.json({ limit: JSON_LIMIT });
    return (request, response, next) => {
      const hasBody =
        request.headers['transfer-encoding'] !== undefined || Number(request.headers['content-length']) > 0;
      if (hasBody && !request.is('application/json')) {
        throw new AppError('unsupportedFile', 'Send this request as application/json.');
      }
      json(request, response, next);
    };
  }
  const upload = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: guard.uploadBytes, files: 1, fields: 4, parts: 5 },
    defParamCharset: 'utf8',
  });
  return upload.single('file');
}

function uploadedFile(guard: Guard, request: Request) {
  if (guard.uploadBytes === undefined) return null;
  const file = request.file;
  if (file === undefined)
    throw new AppError('badRequest', 'Choose a file first: the field named file is empty.');
  return { name: file.originalname, bytes: file.buffer };
}

/** A signal that is aborted when the client closes the connection before the answer is out. */
function leaving(response: Response): AbortSignal {
  const controller = new AbortController();
  response.on('close', () => {
    if (!response.writableFinished) controller.abort();
  });
  return controller.signal;
}

function sendFile(response: Response, reply: FileReply): void {
  response.set({
    'Cache-Control': 'private, no-store',
    // A picture opened by its own address can run nothing.
    'Content-Security-Policy': "default-src 'none'; style-src 'unsafe-inline'; img-src data:; sandbox",
    ...reply.headers,
  });
  if (reply.fileName !== null) response.attachment(reply.fileName);
  response.type(reply.mediaType).send(Buffer.from(reply.bytes));
}

/** Puts every route into the application with its guard, its body reader and its reply. */
export function mountRoutes(app: Express, routes: readonly Route[]): void {
  for (const { contract, guard, answer } of routes) {
    const work: RequestHandler = async (request, response) => {
      const signal = leaving(response);
      const actor = response.locals['actor'] as SignedIn | null;
      const file = uploadedFile(guard, request);
      const address = request.ip ?? '';
      let reply: unknown;
      try {
        reply = await answer({ actor, file, signal, address, request });
      } catch (error) {
        // Nobody is left to read an answer, and giving up was asked for.
        if (signal.aborted) return;
        throw error;
      }
      if (signal.aborted) return;
      if (reply instanceof FileReply) sendFile(response, reply);
      else response.set('Cache-Control', 'no-store').json(reply);
    };
    const door: RequestHandler = (request, response, next) => {
      response.locals['actor'] = admit(guard, request);
      next();
    };
    const method = contract.method.toLowerCase() as Lowercase<typeof contract.method>;
    app[method](contract.path, door, bodyReader(guard), work);
  }
}
