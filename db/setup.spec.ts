import { randomBytes } from 'node:crypto';
import postgres from 'postgres';
import { expect, inject, it } from 'vitest';
import { prepareDatabase } from './setup.ts';

it('may be repeated, also by an administrator that is no superuser', async () => {
  const { adminUrl, secrets } = inject('cluster');
  const name = `lanewright_setup_${randomBytes(4).toString('hex')}`;
  const admin = postgres(adminUrl, { max: 1, onnotice: () => undefined });
  await admin.unsafe(`create role ${name} login createrole createdb password 'only-for-a-test'`);
  const limited = new URL(adminUrl);
  limited.username = name;
  limited.password = 'only-for-a-test';
  try {
    const first = await prepareDatabase({ adminUrl: limited.href, secrets, databaseName: name });
    expect(await prepareDatabase({ adminUrl: limited.href, secrets, databaseName: name })).toEqual(first);
    const app = postgres(first.appUrl, { max: 1 });
    expect(await app`select * from points`).toHaveLength(0);
    await app.end();
  } finally {
    await admin.unsafe(`drop database if exists ${name} with (force)`);
    await admin.unsafe(`drop role ${name}`);
    await admin.end();
  }
});
