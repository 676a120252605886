import type { TestProject } from 'vitest/node';
import { asAdmin, dropLeftOver, makeDatabase, startCluster, type DatabaseUrls } from './cluster';

declare module 'vitest' {
  export interface ProvidedContext {
    cluster: DatabaseUrls;
    template: string;
  }
}

/** Once a run: an empty migrated database from which each test file's own is copied. */
export default async function setup(project: TestProject) {
  const cluster = startCluster('test');
  await dropLeftOver(cluster, 'template');
  await dropLeftOver(cluster, 'copy');
  const name = `template_${process.pid}`;
  await makeDatabase(cluster, name);
  project.provide('cluster', cluster);
  project.provide('template', name);
  return () => asAdmin(cluster.ADMIN_DATABASE_URL, `drop database if exists ${name} with (force)`);
}
