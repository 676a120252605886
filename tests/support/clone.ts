import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, inject } from 'vitest';
import { getDb } from '@/db/client';
import { forgetEnv } from '@/lib/infra/env';
import { asAdmin, inDatabase } from './cluster';

const cluster = inject('cluster');
const name = `copy_${process.pid}_${randomUUID().slice(0, 8)}`;

/** What a test's process has for settings; the database is this file's own copy. */
const settings = {
  ...inDatabase(cluster, name),
  LEAFHALT_MODE: 'test',
  SITE_URL: 'http://127.0.0.1:3000',
  NEXTAUTH_URL: 'http://127.0.0.1:3000',
  NEXTAUTH_SECRET: 'only-for-tests-0123456789abcdef0123',
  TICKET_KEY_SECRET: 'only-for-tests-fedcba9876543210fedc',
  SMTP_URL: 'smtp://127.0.0.1:9',
  STRIPE_SECRET_KEY: 'sk_test_onlyForTests',
  STRIPE_WEBHOOK_SECRET: 'whsec_only_for_tests_0123456789abcdef',
  STRIPE_API_URL: 'http://127.0.0.1:9',
};
Object.assign(process.env, settings);
forgetEnv();

beforeAll(async () => {
  // file_copy is the faster way on a cluster without fsync
  await asAdmin(cluster.ADMIN_DATABASE_URL, `create database ${name} template ${inject('template')} owner leafhalt_owner strategy file_copy`);
});

afterAll(async () => {
  await getDb().$client.end();
  await asAdmin(cluster.ADMIN_DATABASE_URL, `drop database if exists ${name} with (force)`);
});
