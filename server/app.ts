import express, { type Express, type RequestHandler } from 'express';
import { pinoHttp } from 'pino-http';

import { newId } from '#server/db/ids.ts';

import { serveBuiltClient } from './http/client-files.ts';
import { guardBrowser, guardWrites, limitDepth, limitRequests, noteAddress } from './http/guard.ts';
import { healthRoutes } from './http/health.ts';
import type { House } from './http/house.ts';
import { answerNothingHere, answerProblem } from './http/problems.ts';
import { signInRoutes } from './http/sign-in-addresses.ts';
import { designRoutes } from './routes/design/design.ts';
import { newsRoutes } from './routes/design/news.ts';
import { partsRoutes } from './routes/design/parts.ts';
import { revisionRoutes } from './routes/design/revisions.ts';
import { mailboxRoutes } from './routes/mailbox/mailbox.ts';
import { meRoutes } from './routes/me/me.ts';
import { invitationRoutes } from './routes/people/invitations.ts';
import { peopleRoutes } from './routes/people/people.ts';
import { vesselRoutes } from './routes/vessels/vessels.ts';

/** A file of a design may have 20 MB, and is sent as text inside JSON. */
const MOST_BODY = '25mb';

/** The application on a house. It keeps nothing of its own: any number may stand beside each other. */
export function createApp(house: House, client: RequestHandler = serveBuiltClient()): Express {
  const app = express();
  app.locals['house'] = house;
  app.disable('x-powered-by');
  app.set('trust proxy', house.configuration.trustProxy);
  app.set('query parser', 'simple');
  app.use(
    pinoHttp({
      logger: house.log,
      genReqId: (_request, response) => {
        const id = newId();
        response.setHeader('X-Request-Id', id);
        return id;
      },
      autoLogging: { ignore: (request) => request.url === '/healthz' || request.url === '/readyz' },
      // Addresses of ours may hold tokens: the path is logged without its query, and without an invitation's token.
      serializers: {
        req: (request: { id: unknown; method: string; url: string }) => ({
          id: request.id,
          method: request.method,
          path: pathToLog(request.url),
        }),
        res: (response: { statusCode: number }) => ({ status: response.statusCode }),
      },
    }),
  );
  app.use(guardBrowser(house.configuration));
  app.use(healthRoutes);
  app.use(noteAddress, limitRequests());
  app.use('/api', guardWrites(house.configuration));
  app.use(signInRoutes);
  app.use('/api', express.json({ limit: MOST_BODY, strict: true }), limitDepth);
  app.use(
    meRoutes,
    vesselRoutes,
    designRoutes,
    newsRoutes,
    partsRoutes,
    revisionRoutes,
    peopleRoutes,
    invitationRoutes,
    mailboxRoutes,
  );
  app.use('/api', answerNothingHere);
  app.use(client);
  app.use(answerNothingHere);
  app.use(answerProblem);
  return app;
}

function pathToLog(url: string): string {
  const path = url.split('?')[0] ?? '';
  return path.replace(/^(\/api)?\/invitations\/[^/]+/, '$1/invitations/…');
}
