import type { Request } from 'express';
import type { Config } from './config.ts';
import type { Context } from './context.ts';
import type { Database } from './database.ts';
import type { Announcements } from './events.ts';
import type { Logger } from './log.ts';

/** What an instance of the server consists of; handed to every route, never global. */
export interface Services {
  readonly config: Config;
  readonly database: Database;
  readonly announcements: Announcements;
  readonly log: Logger;
  /** Who asks. @throws {NotSignedIn} */
  readonly authenticate: (req: Request) => Context;
}
