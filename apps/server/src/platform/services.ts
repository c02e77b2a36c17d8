import type { Request } from 'express';
import type { Config } from './config.ts';
import type { Context } from './context.ts';
import type { ByteCache } from './byte-cache.ts';
import type { Database } from './database.ts';
import type { Announcements } from './events.ts';
import type { Logger } from './log.ts';
import type { TaskThread } from './tasks/task-thread.ts';

/** What an instance of the server consists of; handed to every route, never global. */
export interface Services {
  readonly config: Config;
  readonly database: Database;
  readonly announcements: Announcements;
  readonly log: Logger;
  /** For work that takes seconds. */
  readonly tasks: TaskThread;
  readonly cache: ByteCache;
  /** Who asks. @throws {NotSignedIn} */
  readonly authenticate: (req: Request) => Context;
}
