/** What the server reads from its environment, once, when it starts. */
export interface Config {
  readonly port: number;
  readonly host: string;
  readonly databaseAppUrl: string;
  readonly databaseAuthUrl: string;
  readonly jwtSecret: string;
  /** Folder of the built client; null: the API alone (development). */
  readonly clientDir: string | null;
}

/** @throws {Error} naming every variable that is missing or wrong, and what it should hold */
export function readConfig(env: NodeJS.ProcessEnv): Config {
  const faults: string[] = [];
  const text = (name: string, holds: string): string => {
    const value = env[name];
    if (!value) faults.push(`${name} is not set; it holds ${holds}.`);
    return value ?? '';
  };
  const port = Number(env['PORT'] || 4200);
  if (!Number.isInteger(port) || port < 0 || port > 65_535) faults.push(`PORT is "${env['PORT']}"; give a number from 0 to 65535.`);
  const config: Config = {
    port,
    host: env['HOST'] || '127.0.0.1',
    databaseAppUrl: text('DATABASE_APP_URL', 'the connection URL of the role lanewright_app'),
    databaseAuthUrl: text('DATABASE_AUTH_URL', 'the connection URL of the role lanewright_auth'),
    jwtSecret: text('JWT_SECRET', 'at least 32 random characters'),
    clientDir: env['CLIENT_DIR'] || null,
  };
  if (config.jwtSecret && config.jwtSecret.length < 32) faults.push('JWT_SECRET is too short; give at least 32 random characters.');
  if (faults.length > 0) throw new Error(`The server cannot start.\n${faults.join('\n')}`);
  return config;
}
