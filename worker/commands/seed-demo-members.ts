import { openDatabase } from '@/db/client';
import type { Role } from '@/lib/domain/people/roles';
import { seedOrganisation } from '@/lib/services/people/seed-organisation';

const organisations: { slug: string; name: string; members: { email: string; roles: Role[] }[] }[] = [
  {
    slug: 'northmoor', name: 'Northmoor Flow Works',
    members: [
      { email: 'owner@northmoor.example', roles: ['owner'] },
      { email: 'engineer@northmoor.example', roles: ['engineer'] },
      { email: 'reviewer@northmoor.example', roles: ['reviewer'] },
      { email: 'auditor@northmoor.example', roles: ['auditor'] },
    ],
  },
  {
    slug: 'southbank', name: 'Southbank Structures',
    members: [{ email: 'engineer@southbank.example', roles: ['owner', 'engineer'] }],
  },
];

const { DATABASE_URL, FOURFOLD_MODE = 'demo', DEMO_PASSWORD = 'fourfold-demo' } = process.env;
if (FOURFOLD_MODE !== 'demo') throw new Error(`Demo accounts have a known password and are made in demo mode only; FOURFOLD_MODE is ${FOURFOLD_MODE}.`);
if (!DATABASE_URL) throw new Error('DATABASE_URL is not set. It names the database as the application’s role.');

const { db } = openDatabase(DATABASE_URL, (error) => console.error(`database connection: ${error.message}`));
try {
  for (const organisation of organisations) {
    const made = await seedOrganisation({ db }, organisation, DEMO_PASSWORD);
    if (made.length === 0) console.log(`${organisation.name} and its members are there already.`);
    for (const line of made) console.log(`Made ${line}.`);
  }
} finally {
  await db.destroy();
}
