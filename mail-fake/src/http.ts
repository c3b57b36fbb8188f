import express, { type ErrorRequestHandler, type Express, type RequestHandler, type Response } from 'express';
import { type Behaviour, readBehaviour } from './behaviour.js';
import { parseAttachment, parseMessage } from './message.js';
import { pageRoutes } from './page/routes.js';
import { deliver, readDelivery } from './player.js';
import { invalidInput, Problem } from './problem.js';
import { SIZE_LIMIT_BYTES } from './smtp.js';
import type { ListQuery, MessageStore, MessageSummary } from './store.js';

const PAGE_SIZE = 100;
const LARGEST_PAGE = 500;

/** The HTTP side: the JSON API below /api and the page for people at /. */
export function createHttpApp(store: MessageStore, behaviour: Behaviour): Express {
  const app = express();
  app.disable('x-powered-by');
  app.set('query parser', 'simple');
  app.use(onlyLocalNames);
  app.use('/api', apiRoutes(store, behaviour));
  app.use(pageRoutes(store, behaviour));
  app.use((request) => {
    throw new Problem(404, 'no-such-route', `There is nothing at ${request.method} ${request.path}.`);
  });
  app.use(answerWithProblem);
  return app;
}

function apiRoutes(store: MessageStore, behaviour: Behaviour): express.Router {
  const routes = express.Router();
  routes.use((_request, response, next) => {
    response.set('Cache-Control', 'no-store');
    next();
  });
  routes.get('/health', (_request, response) => {
    response.json({ status: 'ok', messages: store.count, behaviour: behaviour.current });
  });
  messageRoutes(routes, store);
  routes.get('/behaviour', (_request, response) => {
    response.json(behaviour.current);
  });
  routes.put('/behaviour', onlyJson, express.json({ limit: '16kb' }), (request, response) => {
    behaviour.set(readBehaviour(request.body));
    response.json(behaviour.current);
  });
  // The limit leaves room for what JSON adds to the text.
  routes.post('/deliver', onlyJson, express.json({ limit: SIZE_LIMIT_BYTES * 2 }), async (request, response) => {
    response.json({ reply: await deliver(readDelivery(request.body)) });
  });
  return routes;
}

function messageRoutes(routes: express.Router, store: MessageStore): void {
  routes.get('/messages', (request, response) => {
    const page = store.list(readListQuery(request.query));
    if (!page) {
      throw invalidInput([{ field: 'before', code: 'unknown', message: 'is not a message that is kept' }]);
    }
    response.set('X-Total-Count', String(page.total));
    if (page.next) {
      const query = new URLSearchParams({ ...(request.query as Record<string, string>), before: page.next });
      response.set('Link', `</api/messages?${query}>; rel="next"`);
    }
    response.json(page.messages);
  });
  routes.delete('/messages', async (_request, response) => {
    await store.deleteAll();
    response.status(204).end();
  });
  routes.get('/messages/:id', async (request, response) => {
    const { message, raw } = await read(store, request.params.id);
    response.json({ ...message, ...(await parseMessage(raw)) });
  });
  routes.get('/messages/:id/raw', async (request, response) => {
    const { message, raw } = await read(store, request.params.id);
    sendFile(response, raw, `${message.id}.eml`, 'message/rfc822');
  });
  routes.get('/messages/:id/attachments/:index', async (request, response) => {
    const { raw } = await read(store, request.params.id);
    const index = /^\d{1,6}$/.test(request.params.index) ? Number(request.params.index) : -1;
    const attachment = await parseAttachment(raw, index);
    if (!attachment) {
      throw new Problem(404, 'no-such-attachment', `The message has no attachment ${request.params.index}.`);
    }
    sendFile(response, attachment.content, attachment.filename ?? `part-${index}`, attachment.contentType);
  });
}

function readListQuery(query: Record<string, unknown>): ListQuery {
  for (const field of ['to', 'limit', 'before']) {
    if (Array.isArray(query[field])) {
      throw invalidInput([{ field, code: 'repeated', message: 'may be given once' }]);
    }
  }
  const { to, before, limit } = query as Record<string, string | undefined>;
  const size = limit === undefined ? PAGE_SIZE : Number(limit);
  if (!Number.isInteger(size) || size < 1 || size > LARGEST_PAGE) {
    const message = `must be a whole number, 1 to ${LARGEST_PAGE}`;
    throw invalidInput([{ field: 'limit', code: 'out-of-range', message }]);
  }
  return { to, before, limit: size };
}

async function read(store: MessageStore, id: string): Promise<{ message: MessageSummary; raw: Buffer }> {
  const found = await store.read(id);
  if (!found) {
    throw new Problem(404, 'no-such-message', 'No such message is kept.');
  }
  return found;
}

/** As a download only: what a message carries must never be shown as a page of this origin. */
function sendFile(response: Response, content: Buffer, filename: string, contentType: string): void {
  response.attachment(filename.replace(/[\u0000-\u001f\u007f/\\]/g, '_'));
  response.set('Content-Type', /^[\w.+-]+\/[\w.+-]+$/.test(contentType) ? contentType : 'application/octet-stream');
  response.set('X-Content-Type-Options', 'nosniff');
  response.set('Content-Security-Policy', "default-src 'none'; sandbox");
  response.end(content);
}

const onlyJson: RequestHandler = (request, _response, next) => {
  if (!request.is('application/json')) {
    throw new Problem(415, 'not-json', 'Send the body as application/json.');
  }
  next();
};

/** Answers to local names only, so that a web page can't read the mail through a name that it points at 127.0.0.1. */
const onlyLocalNames: RequestHandler = (request, _response, next) => {
  if (!['127.0.0.1', 'localhost'].includes(request.hostname)) {
    throw new Problem(403, 'not-local', 'This server answers on 127.0.0.1 and localhost only.');
  }
  next();
};

const answerWithProblem: ErrorRequestHandler = (error, _request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const problem = toProblem(error);
  if (problem.status >= 500 && !(error instanceof Problem)) {
    console.error(error);
  }
  response.status(problem.status).type('application/problem+json').send(JSON.stringify(problem));
};

function toProblem(error: unknown): Problem {
  if (error instanceof Problem) {
    return error;
  }
  const { status, type } = error as { status?: number; type?: string };
  if (type === 'entity.too.large') {
    return new Problem(413, 'too-large', 'The body is larger than this route takes.');
  }
  if (status !== undefined && status >= 400 && status < 500) {
    return new Problem(400, 'not-understood', 'The request could not be read; is it well-formed?');
  }
  return new Problem(500, 'failed', 'The request failed; the reason is in the log of the server.');
}
