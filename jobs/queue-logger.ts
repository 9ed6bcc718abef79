import { Logger } from 'graphile-worker';
import type { Env } from '@/lib/env';

const RANK = { error: 0, warning: 1, warn: 1, info: 2, debug: 3 } as const;

/** The queue's own log: what it calls information (every job that went well) is a detail to us. */
export function queueLogger(level: Env['LOG_LEVEL']): Logger {
  return new Logger(() => (said, message) => {
    const rank = said === 'info' ? RANK.debug : RANK[said];
    if (rank > RANK[level]) return;
    if (rank <= RANK.warn) console.error(message);
    else console.log(message);
  });
}
