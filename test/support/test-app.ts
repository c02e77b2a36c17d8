import type { Role } from '#contract';
import type { Express } from 'express';
import supertest from 'supertest';
import { type App, createApp } from '../../apps/server/src/app.ts';
import { createLog } from '../../apps/server/src/platform/log.ts';
import { buildOrganisation, PASSWORD, type TestOrganisation } from './organisation.ts';
import { type TestDatabase, testDatabase } from './test-database.ts';

/** Keeps the cookies of one person. */
export type Agent = ReturnType<typeof supertest.agent>;

export const JWT_SECRET = 'only for tests: thirty-two characters and more';

/** A running server instance on a database of its own, with two organisations. */
export interface TestApp {
  readonly express: Express;
  readonly database: TestDatabase;
  readonly org: TestOrganisation;
  readonly otherOrg: TestOrganisation;
  /** A person of `org` with this role, signed in; the same agent at each call. */
  as(role: Role): Promise<Agent>;
  /** A person of the other organisation, signed in. */
  asOther(role: Role): Promise<Agent>;
  /** Somebody who is not signed in. */
  stranger(): Agent;
  /** A second instance of the server on the same database. */
  secondInstance(): Promise<Express>;
  close(): Promise<void>;
}

export async function testApp(): Promise<TestApp> {
  const database = await testDatabase();
  const org = await buildOrganisation(database.owner, 'brackwater');
  const otherOrg = await buildOrganisation(database.owner, 'hillside');
  const instances: App[] = [];
  const start = async () => {
    const app = await createApp(configOf(database), createLog(process.env['TEST_LOG'] ?? 'silent'));
    instances.push(app);
    return app.express;
  };
  const express = await start();
  const agents = new Map<string, Promise<Agent>>();
  const agentOf = (email: string): Promise<Agent> => {
    const known = agents.get(email) ?? signedIn(express, email);
    agents.set(email, known);
    return known;
  };
  return {
    express, database, org, otherOrg,
    as: (role) => agentOf(org.emails[role]),
    asOther: (role) => agentOf(otherOrg.emails[role]),
    stranger: () => supertest.agent(express),
    secondInstance: start,
    close: async () => {
      for (const instance of instances) await instance.close();
      await database.drop();
    },
  };
}

/** Signs a person in at an instance. */
export async function signedIn(express: Express, email: string): Promise<Agent> {
  const agent = supertest.agent(express);
  await agent.post('/api/v1/auth/sign-in').send({ email, password: PASSWORD }).expect(200);
  return agent;
}

const configOf = ({ appUrl, authUrl }: TestDatabase) => ({
  port: 0, host: '127.0.0.1', databaseAppUrl: appUrl, databaseAuthUrl: authUrl, jwtSecret: JWT_SECRET, clientDir: null,
});
