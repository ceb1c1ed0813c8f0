import type { RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import { ShopError } from '#server/errors.ts';

const WINDOW_MS = 60_000;
const TRIES = 20;

/** For doors open to anyone: links and first passwords cannot be tried out by the thousand, nor the server kept busy hashing. */
export const fewTries = (): RequestHandler =>
  rateLimit({
    windowMs: WINDOW_MS,
    limit: TRIES,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    validate: { xForwardedForHeader: false },
    handler: (_request, _response, next) =>
      next(new ShopError('too-many-tries', 'Too many tries in a short time. Wait a minute, then try again.')),
  });
