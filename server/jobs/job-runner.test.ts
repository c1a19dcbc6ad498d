import { type ApiHarness, startApi } from '../testing/api-harness';
import { type JobKind, type JobRun } from './job-kind';
import { createJobRunner } from './job-runner';

let api: ApiHarness;
beforeAll(async () => {
  api = await startApi({ modules: [] });
});
afterAll(() => api.close());

interface JobState {
  readonly state: string;
  readonly progress: number;
  readonly attempts: number;
  readonly message: string | null;
}

async function queue(kind: string, more = ''): Promise<string> {
  const [row] = await api.database.query<{ id: string }>(
    'maintenance',
    `insert into jobs (organisation_id, kind, payload, created_by ${more === '' ? '' : ', state, attempts, lease_until'})
     values ($1, $2, '{"n": 1}', $3 ${more}) returning id`,
    [api.first.id, kind, api.first.userIds.get('aerodynamicist')],
  );
  return row?.id ?? '';
}

async function stateOf(id: string): Promise<JobState | undefined> {
  const [row] = await api.database.query<JobState>(
    'maintenance',
    'select state, progress, attempts, message from jobs where id = $1',
    [id],
  );
  return row;
}

async function runAll(...kinds: readonly JobKind[]): Promise<void> {
  await createJobRunner(api.container, kinds).idle();
}

test('a job is done inside its own organisation, as the person who asked for it', async () => {
  const id = await queue('look');
  const seen: unknown[] = [];
  await runAll({
    kind: 'look',
    run: async (run) => {
      await run.progress(3, 5);
      await run.inTransaction(async ({ tx, userId, organisationId }) => {
        const { rows } = await tx.execute<{ slug: string }>('select slug from organisations');
        seen.push(run.payload, userId, organisationId, ...rows.map((row) => row.slug));
      });
    },
  });
  expect(seen).toEqual([{ n: 1 }, api.first.userIds.get('aerodynamicist'), api.first.id, api.first.slug]);
  expect(await stateOf(id)).toMatchObject({ state: 'done', progress: 3, attempts: 1 });
});

test('a job whose server was killed is taken up again once its lease has run out, not before', async () => {
  const dead = await queue('again', `, 'running', 1, now() - interval '1 second'`);
  const alive = await queue('again', `, 'running', 1, now() + interval '1 hour'`);
  const attempts: number[] = [];
  await runAll({ kind: 'again', run: async (run) => void attempts.push(run.attempt) });
  expect(attempts).toEqual([2]);
  expect(await stateOf(dead)).toMatchObject({ state: 'done' });
  expect(await stateOf(alive)).toMatchObject({ state: 'running', attempts: 1 });
});

test('a job that a person cancels stops at its next step and tidies up', async () => {
  const id = await queue('stop');
  const outcomes: string[] = [];
  const steps: number[] = [];
  await runAll({
    kind: 'stop',
    run: async (run: JobRun) => {
      for (let step = 0; step < 5; step += 1) {
        steps.push(step);
        if (step === 2) {
          await api.database.query(
            'maintenance',
            'update jobs set cancel_requested_at = now() where id = $1',
            [id],
          );
        }
        await run.progress(step);
      }
    },
    onEnd: async (_work, _payload, outcome) => void outcomes.push(outcome),
  });
  expect(steps).toEqual([0, 1, 2]);
  expect(outcomes).toEqual(['cancelled']);
  expect(await stateOf(id)).toMatchObject({ state: 'cancelled' });
});

test('a job that was interrupted as often as it may be fails, and says nothing of the inside', async () => {
  const id = await queue('fragile', `, 'running', 3, now() - interval '1 second'`);
  const quiet = jest.spyOn(api.container.log, 'error').mockReturnValue(undefined);
  await runAll({ kind: 'fragile', run: async () => undefined });
  quiet.mockRestore();
  expect(await stateOf(id)).toMatchObject({ state: 'failed', message: 'Something went wrong on our side.' });
});

test('a job that throws is tried again later', async () => {
  const id = await queue('throw');
  const quiet = jest.spyOn(api.container.log, 'error').mockReturnValue(undefined);
  await runAll({
    kind: 'throw',
    run: async () => {
      throw new Error('broken inside');
    },
  });
  quiet.mockRestore();
  expect(await stateOf(id)).toMatchObject({ state: 'queued', attempts: 1, message: null });
});
