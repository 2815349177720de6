import { type DestinationStream, type Logger, pino } from 'pino';
import type { Env } from './env.ts';

/** A failed query carries its values, and those are what people wrote. */
const OF_PEOPLE = ['err.parameters', 'err.sql', 'err.driverError.sql', 'err.driverError.parameters'];

/** The server's log: JSON lines, on standard output unless told. */
export function createLog(level: Env['LOG_LEVEL'], destination?: DestinationStream): Logger {
  const options = { level, redact: { paths: OF_PEOPLE, censor: '(left out)' } };
  return destination ? pino(options, destination) : pino(options);
}
