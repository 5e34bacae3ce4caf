/** The one logger: JSON lines on standard output, with everything that identifies or authorises taken out. */
import pino, { type DestinationStream, type Logger } from 'pino';
import { describeError } from '@/lib/describe-error';
import { env } from '@/lib/env';

const KEY = Symbol.for('curvekeep.log');
const shared = globalThis as typeof globalThis & { [KEY]?: Logger };

const SECRET_FIELDS = [
  'authorization',
  'cookie',
  '["set-cookie"]',
  '["x-curvekeep-peer"]',
  '["x-forwarded-for"]',
];

/** The logger of this process; level from LOG_LEVEL. */
export function log(): Logger {
  shared[KEY] ??= createLogger(env().logLevel);
  return shared[KEY];
}

/**
 * A logger of that level.
 *
 * @param destination where its lines go; standard output where left out
 */
export function createLogger(level: string, destination?: DestinationStream): Logger {
  const paths = SECRET_FIELDS.flatMap((field) => {
    const member = field.startsWith('[') ? field : `.${field}`;
    return [field, `headers${member}`, `*.headers${member}`];
  });
  const options = {
    ...{ level, base: { app: 'curvekeep' }, redact: { paths, remove: true } },
    serializers: { err: (error: unknown) => describeError(error) },
  };
  return destination ? pino(options, destination) : pino(options);
}
