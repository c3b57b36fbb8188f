import express from 'express';
import type { Behaviour } from '../behaviour.js';
import { parseMessage } from '../message.js';
import type { MessageStore } from '../store.js';
import { html } from './html.js';
import { layout } from './layout.js';
import { listPage } from './list-page.js';
import { messagePage } from './message-page.js';
import { SCRIPT } from './script.js';
import { STYLES } from './styles.js';

const PAGE_SIZE = 50;
// Inline styles are for the HTML part of a message: its frame is bound by this policy too.
const POLICY = [
  "default-src 'none'",
  "script-src 'self'",
  "style-src 'self' 'unsafe-inline'",
  'img-src data:',
  "connect-src 'self'",
  "form-action 'self'",
  "base-uri 'none'",
  "frame-ancestors 'none'",
].join('; ');

/** The page for people: the list at /, a message at /messages/:id. */
export function pageRoutes(store: MessageStore, behaviour: Behaviour): express.Router {
  const routes = express.Router();
  routes.use((_request, response, next) => {
    response.set('Content-Security-Policy', POLICY);
    response.set('X-Content-Type-Options', 'nosniff');
    response.set('Referrer-Policy', 'no-referrer');
    response.set('Cache-Control', 'no-store');
    next();
  });
  routes.get('/page.css', (_request, response) => {
    response.type('css').send(STYLES);
  });
  routes.get('/page.js', (_request, response) => {
    response.type('js').send(SCRIPT);
  });
  routes.get('/', (request, response) => {
    const to = firstText(request.query.to).trim();
    const before = firstText(request.query.before) || undefined;
    const page = store.list({ to: to || undefined, before, limit: PAGE_SIZE });
    if (!page) {
      response.redirect('/');
      return;
    }
    response.send(listPage({ ...page, to, isFirst: before === undefined, behaviour: behaviour.current }));
  });
  routes.get('/messages/:id', async (request, response) => {
    const found = await store.read(request.params.id);
    if (!found) {
      const body = html`<h1>Not here</h1><p>This message was deleted, or was never caught. <a href="/">All messages</a></p>`;
      response.status(404).send(layout('Not here', body));
      return;
    }
    response.send(messagePage(found.message, await parseMessage(found.raw, true)));
  });
  return routes;
}

function firstText(value: unknown): string {
  const first: unknown = Array.isArray(value) ? value[0] : value;
  return typeof first === 'string' ? first : '';
}
