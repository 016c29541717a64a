import { randomBytes } from 'node:crypto';
import postgres from 'postgres';
import { afterAll, inject } from 'vitest';

// Before each test file: a database of its own, which the product's code finds through the environment.
const url = (database: string) => inject('clusterUrl').replace('*', database);
const name = `file_${process.pid}_${randomBytes(6).toString('hex')}`;
const server = postgres(url('postgres'), { max: 1, onnotice: () => {} });
await server`create database ${server(name)} template template_trymark`;

process.env.DATABASE_URL = url(name);
process.env.APP_URL = 'http://127.0.0.1:3000';
process.env.APP_SECRET = 'a secret that only the tests know, long enough';
process.env.LOG_LEVEL = 'silent';

afterAll(async () => {
  const { closeDatabases } = await import('./database');
  await closeDatabases();
  await server`drop database ${server(name)} with (force)`;
  await server.end();
});
