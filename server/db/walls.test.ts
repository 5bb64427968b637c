import { Client } from 'pg';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { type Api, startApi } from '#tests/support/api.ts';
import { asAdmin } from '#tests/support/admin.ts';
import { Athlete } from '../features/athletes/athlete.entity.ts';
import { Visit } from '../features/visits/visit.entity.ts';
import { AuditEntry } from '../features/audit/audit-entry.entity.ts';
import { PRACTICE_FILTER } from './columns.ts';
import { product } from './in-practice.ts';

let api: Api;
beforeAll(async () => {
  api = await startApi();
});
afterAll(() => api.close());

describe('the first wall, the ORM’s filter', () => {
  it('throws where no practice is set', async () => {
    const em = api.ground.orm.em.fork();
    await expect(em.find(Athlete, {})).rejects.toThrow(/practice/);
    await expect(em.count(Athlete)).rejects.toThrow(/practice/);
    await expect(em.nativeUpdate(Athlete, {}, { sport: 'none' })).rejects.toThrow(/practice/);
    await expect(em.nativeDelete(Athlete, {})).rejects.toThrow(/practice/);
  });

  it('gives back the rows of one practice', async () => {
    const rows = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      em.find(Athlete, {}),
    );
    expect(rows.map((row) => row.id)).toEqual([api.world.athlete.id]);
  });
});

describe('the second wall, row-level security', () => {
  const here = () => product(api.world.practiceId);

  it('hides other practices even with the filter off', async () => {
    const ids = await api.ground.inPractice(here(), async ({ em }) => {
      const rows = await em.find(Athlete, {}, { filters: { [PRACTICE_FILTER]: false } });
      return rows.map((row) => row.id);
    });
    expect(ids).toEqual([api.world.athlete.id]);
  });

  it('hides everything outside a unit of work, also in a connection that had one', async () => {
    const em = api.ground.orm.em.fork();
    expect(await em.execute('select id from athlete')).toEqual([]);
    await api.ground.inPractice(here(), ({ em: inside }) => inside.execute('select 1'));
    expect(await em.execute('select id from athlete')).toEqual([]);
  });

  it('lets nobody write into another practice', async () => {
    const { foreignAthlete, foreignPracticeId } = api.world;
    await api.ground.inPractice(here(), async ({ em }) => {
      const changed = await em.execute(`update athlete set sport = 'x' where id = ? returning id`, [
        foreignAthlete.id,
      ]);
      expect(changed).toEqual([]);
    });
    const moved = api.ground.inPractice(here(), ({ em }) =>
      em.execute(`update athlete set practice_id = ? where practice_id = current_practice()`, [
        foreignPracticeId,
      ]),
    );
    await expect(moved).rejects.toThrow(/row-level security/);
  });

  it('stands on every table of the product, also for its owner', async () => {
    const open = await asAdmin(
      async (client) =>
        (
          await client.query<{ relname: string }>(
            `select relname from pg_class where relkind = 'r' and relnamespace = 'public'::regnamespace
             and relname <> 'mikro_orm_migrations' and not (relrowsecurity and relforcerowsecurity)`,
          )
        ).rows,
      new URL(api.ground.config.database.app).pathname.slice(1),
    );
    expect(open).toEqual([]);
  });
});

describe('references', () => {
  it('cannot point into another practice', async () => {
    const { practiceId, coach, foreignAthlete } = api.world;
    const made = api.ground.inPractice(product(practiceId), ({ em }) =>
      Promise.resolve(
        em.create(Visit, {
          athlete: foreignAthlete.id,
          coach: coach.id,
          day: '2026-01-05',
          note: '',
          filming: {
            distanceMm: null,
            lensHeightMm: null,
            rodMm: null,
            beltPointerMm: null,
            thighPointerMm: null,
          },
        }),
      ),
    );
    await expect(made).rejects.toThrow(/visit_athlete_id_fk/);
  });
});

describe('the audit trail', () => {
  const entry = async (): Promise<string> => {
    const made = await api.ground.inPractice(product(api.world.practiceId), ({ em }) =>
      Promise.resolve(
        em.create(AuditEntry, {
          actor: 'product',
          action: 'test',
          subject: 'athlete',
          subjectId: api.world.athlete.id,
        }),
      ),
    );
    return made.id;
  };

  const CHANGES = [
    `update audit_entry set action = 'x'`,
    `update audit_entry set action = 'x' where false`,
    'delete from audit_entry',
    'truncate audit_entry',
    'truncate practice cascade',
  ];

  it('is neither changed, deleted nor emptied by the product', async () => {
    await entry();
    for (const sql of CHANGES) {
      await expect(
        api.ground.inPractice(product(api.world.practiceId), ({ em }) => em.execute(sql)),
      ).rejects.toThrow(/permission denied/);
    }
  });

  it.each([
    ['jobs', /permission denied/],
    ['owner', /only added to/],
  ] as const)('nor by the role for %s', async (role, refusal) => {
    await entry();
    const client = new Client({ connectionString: api.ground.config.database[role] });
    await client.connect();
    try {
      for (const sql of CHANGES) await expect(client.query(sql)).rejects.toThrow(refusal);
    } finally {
      await client.end();
    }
  });

  it('nor by the superuser', async () => {
    await entry();
    const database = new URL(api.ground.config.database.app).pathname.slice(1);
    for (const sql of CHANGES) {
      await expect(asAdmin((client) => client.query(sql), database)).rejects.toThrow(
        /only added to/,
      );
    }
  });
});
