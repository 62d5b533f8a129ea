import express, { type Express } from 'express';
import helmet from 'helmet';
import { checkOrigin } from './access/check-origin';
import { endpoints } from './endpoints';
import { AppError } from './errors';
import { apiPages } from './http/api-pages';
import { clientPages } from './http/client-pages';
import type { Services } from './http/context';
import { healthRouter } from './http/health';
import { problemHandler } from './http/problem';
import { requestLog } from './http/request-log';
import { createRouter } from './http/router';

/** The whole server as an Express application; it owns no process, socket or timer. */
export function createApp(services: Services): Express {
  const { config, log } = services;
  const app = express();
  app.disable('x-powered-by');
  app.set('trust proxy', config.trustProxy);
  app.set('query parser', 'simple');
  app.use(
    requestLog(log, config),
    helmet({
      contentSecurityPolicy: {
        directives: {
          defaultSrc: ["'self'"],
          scriptSrc: ["'self'"],
          styleSrc: ["'self'", "'unsafe-inline'"],
          imgSrc: ["'self'", 'data:', 'blob:'],
          workerSrc: ["'self'", 'blob:'],
          upgradeInsecureRequests: config.secureCookies ? [] : null,
        },
      },
      strictTransportSecurity: config.secureCookies,
    }),
    healthRouter(services),
    checkOrigin(config),
    express.json({ limit: '8mb' }),
  );
  app.use('/api/v1', createRouter(endpoints, services));
  app.use('/api', apiPages(endpoints, config.publicUrl));
  app.use('/api', () => {
    throw new AppError('not-found', 'Nothing is at this address.');
  });
  app.use(clientPages());
  app.use(problemHandler(log, config.uploadLimitMb));
  return app;
}
