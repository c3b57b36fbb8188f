import { randomBytes } from 'node:crypto';
import express, { type ErrorRequestHandler, type Express, type RequestHandler } from 'express';
import { authenticate, type Credentials } from './authentication.js';
import { behaviourRouter, type Behaviour } from './behaviour.js';
import type { Context } from './context.js';
import { S3Error } from './errors.js';
import { operationFor } from './routes.js';
import { S3Call } from './s3-call.js';
import { errorDocument } from './xml.js';

export function createApp(context: Context, credentials: Credentials, behaviour: Behaviour): Express {
  const app = express();
  app.disable('x-powered-by');
  app.disable('etag');
  app.use(nameRequest);
  // No bucket can have this name: a bucket's starts with a letter or a digit.
  app.use('/__behaviour', behaviourRouter(behaviour), refuseBadSwitch);
  app.use(serveS3(context, credentials, behaviour));
  app.use(refuse);
  return app;
}

const nameRequest: RequestHandler = (_request, response, next) => {
  response.setHeader('x-amz-request-id', randomBytes(8).toString('hex').toUpperCase());
  next();
};

function serveS3(context: Context, credentials: Credentials, behaviour: Behaviour): RequestHandler {
  return async (request, response) => {
    await behaviour.apply();
    const call = new S3Call(request, response);
    call.authenticated = authenticate(call.signed, credentials, new Date());
    await operationFor(call)(call, context);
  };
}

const refuseBadSwitch: ErrorRequestHandler = (_error, _request, response, _next) => {
  response.status(400).json({ error: 'the body must be JSON such as {"mode": "ok"}' });
};

const refuse: ErrorRequestHandler = (error: unknown, request, response, _next) => {
  if (request.destroyed && !request.complete) return;
  if (!(error instanceof S3Error)) console.error('object-store-fake:', error);
  if (response.headersSent) {
    // Cut off, so that the client can't take the part it has for the whole.
    response.destroy();
    return;
  }
  const refusal = error instanceof S3Error ? error : new S3Error('InternalError');
  const requestId = String(response.getHeader('x-amz-request-id'));
  const body = Buffer.from(errorDocument(refusal, request.originalUrl.split('?')[0] ?? '', requestId));
  for (const name of response.getHeaderNames()) {
    if (name !== 'x-amz-request-id') response.removeHeader(name);
  }
  response.statusCode = refusal.status;
  response.setHeader('Content-Type', 'application/xml');
  response.setHeader('Content-Length', body.length);
  response.end(body);
  // The rest of an upload is read and thrown away, since many clients read the answer only after sending all.
  request.resume();
};
