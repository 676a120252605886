// Plants the demo club, once: the comment on the database says when it was complete, so a broken-off planting shows.
// Run with the portal's settings and MIGRATE_DATABASE_URL; prints one line of JSON: the day, and the demo sign-ins.
import { Client } from 'pg';
import { seed } from '../seed/run';
import { DEMO_SIGN_INS } from '../seed/sign-ins';

const owner = new Client({ connectionString: process.env['MIGRATE_DATABASE_URL'] });
await owner.connect();
const { rows } = await owner.query<{ note: string | null }>("select shobj_description(oid, 'pg_database') as note from pg_database where datname = current_database()");
let plantedOn = /^planted (\S+)/.exec(rows[0]?.note ?? '')?.[1];
if (plantedOn === undefined) {
  await seed({ cardsFile: process.env['CARDS_FILE'] });
  plantedOn = new Date().toISOString().slice(0, 10);
  await owner.query(`do $$ begin execute format('comment on database %I is %L', current_database(), 'planted ${plantedOn}'); end $$`);
}
await owner.end();
console.log(JSON.stringify({ plantedOn, signIns: DEMO_SIGN_INS }));
process.exit(0); // the seed's own pool may still hold a connection
