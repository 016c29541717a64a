import postgres from 'postgres';
import type { TestProject } from 'vitest/node';
import { migrateDatabase } from '@/scripts/migrate';
import { openFleetingCluster } from '@/scripts/setup/cluster.mjs';
import { ensurePostgres } from '@/scripts/setup/packages.mjs';

declare module 'vitest' {
  interface ProvidedContext {
    /** Address of the test cluster, with the name of its database left open as `*`. */
    clusterUrl: string;
  }
}

/** A cluster for this run with one migrated database, of which every test file gets a copy. */
export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  await ensurePostgres();
  const cluster = await openFleetingCluster('integration');
  try {
    const server = postgres(cluster.url('postgres'), { max: 1, onnotice: () => {} });
    await server`create database template_trymark`;
    await server.end();
    await migrateDatabase(cluster.url('template_trymark'));
  } catch (error) {
    await cluster.remove();
    throw error;
  }
  project.provide('clusterUrl', cluster.url('*'));
  return cluster.remove;
}
