import type { NestExpressApplication } from '@nestjs/platform-express';
import compression from 'compression';
import cookieParser from 'cookie-parser';
import helmet from 'helmet';
import { validationPipe } from './common/problems/validation.pipe.js';
import { jsonBody } from './common/web/json-body.js';
import { serveWeb } from './common/web/serve-web.js';
import { Settings } from './config/settings.js';

/** Everything between the socket and the routes; the tests' application has the same. */
export function setUp(app: NestExpressApplication): NestExpressApplication {
  const settings = app.get(Settings);
  app.set('trust proxy', 'loopback');
  app.set('query parser', 'simple');
  app.disable('x-powered-by');
  app.use(
    helmet({
      contentSecurityPolicy: {
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
          styleSrc: ["'self'", "'unsafe-inline'"],
          fontSrc: ["'self'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          workerSrc: ["'self'", 'blob:'],
          upgradeInsecureRequests: null,
        },
      },
      strictTransportSecurity: settings.secureCookies,
    }),
  );
  // an event stream must not wait in a compressor
  app.use(compression({ filter: (request, response) => !String(response.getHeader('Content-Type')).startsWith('text/event-stream') && compression.filter(request, response) }));
  app.use(cookieParser());
  app.useBodyParser('json', jsonBody);
  app.useGlobalPipes(validationPipe());
  app.setGlobalPrefix('api');
  app.enableShutdownHooks();
  serveWeb(app, settings.webFolder);
  return app;
}
