import express, { type RequestHandler } from 'express';
import { actorOf } from '#server/middleware/route.ts';

const small = express.json({ limit: '256kb' });
/** A plan of a large job carries every layout. */
const large = express.json({ limit: '20mb' });

/** Reads a JSON body; only the signed-in may send a large one, and only where plans are saved. */
export const readJson: RequestHandler = (request, response, next) => {
  const parse = actorOf(response) && /^\/plan(s|ning)$/.test(request.path) ? large : small;
  parse(request, response, next);
};
