import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import Ajv2020 from 'ajv/dist/2020';
import { OPERATION_NAMES, NOT_YET_AVAILABLE } from './operations';
import { REFUSAL_TITLES } from './refusal-titles';
import { run } from './run';
import fixture from './testing/method-cases.json';

type Json = Record<string, unknown>;

const air = { temperatureC: 20, pressurePa: 1e5, relativeHumidity: 0.5 };
const cycle = { cycle: 'udds', f0N: 100, f1NPerKmh: 0, f2NPerKmh2: 0.03, massKg: 1500 };
const blockage = {
  facility: { kind: 'closed', areaM2: 40, blockage: { method: 'area-ratio' } },
  frontalAreaM2: 2.2,
  coefficient: 0.3,
  quotedAreaM2: 2.2,
  quotedAreaScale: 'full',
};
const inFacility = (changes: Json): Json => ({ ...blockage, facility: { ...blockage.facility, ...changes } });
const points = [0, 4, 8].map((yawDeg) => ({ yawDeg, dragAreaM2: 0.6 + yawDeg / 100, uM2: 0.001 }));
const yaw = { points, referenceSpeedKmh: 120 };

async function refusalOf(operation: string, text: string): Promise<Json> {
  const answer = await run([operation], () => text);
  expect(answer).toMatchObject({ stdout: '', exitCode: 2 });
  return JSON.parse(answer.stderr) as Json;
}

describe('What is wrong with an input is told apart', () => {
  it.each<readonly [string, Json | string, string, string]>([
    ['air', '{', 'not-json', 'input'],
    ['air', '[]', 'malformed-input', 'input'],
    ['air', 'null', 'malformed-input', 'input'],
    ['air', { ...air, temperature: 20 }, 'malformed-input', 'temperature'],
    ['air', { ...air, temperatureC: '20' }, 'malformed-input', 'temperatureC'],
    ['air', '{"temperatureC":1e999,"pressurePa":1e5,"relativeHumidity":0.5}', 'not-a-number', 'temperatureC'],
    ['air', { ...air, relativeHumidity: null }, 'missing-input', 'air.relativeHumidity'],
    ['air', { state: 'isa' }, 'unknown-air-state', 'air.state'],
    ['student-quantile', {}, 'missing-input', 'lowerTailProbability'],
    ['student-quantile', { lowerTailProbability: 1 }, 'probability-out-of-range', 'lowerTailProbability'],
    [
      'student-quantile',
      { lowerTailProbability: 0.9, degreesOfFreedom: 0 },
      'degrees-of-freedom',
      'degreesOfFreedom',
    ],
    [
      'student-quantile',
      { lowerTailProbability: 0.9, degreesOfFreedom: -2 },
      'degrees-of-freedom',
      'degreesOfFreedom',
    ],
    ['blockage', { ...blockage, scale: 0 }, 'scale-out-of-range', 'scale'],
    ['blockage', { ...blockage, scale: 1.01 }, 'scale-out-of-range', 'scale'],
    ['blockage', { ...blockage, frontalAreaM2: 0 }, 'not-positive', 'frontalAreaM2'],
    ['blockage', { ...blockage, frontalAreaM2: 40 }, 'model-larger-than-section', 'facility.areaM2'],
    ['blockage', { ...blockage, frontalAreaM2: 5 }, 'blockage', 'facility'],
    ['blockage', { ...blockage, quotedAreaScale: 'half' }, 'malformed-input', 'quotedAreaScale'],
    ['blockage', inFacility({ kind: 'road' }), 'malformed-input', 'facility.kind'],
    ['blockage', inFacility({ blockage: { method: 'solid' } }), 'unknown-method', 'facility.blockage.method'],
    ['blockage', inFacility({ blockage: { method: 'maskell' } }), 'missing-input', 'facility.blockage.theta'],
    [
      'blockage',
      inFacility({ blockage: { method: 'factor', factor: 0 } }),
      'not-positive',
      'facility.blockage.factor',
    ],
    [
      'blockage',
      inFacility({ blockage: { method: 'none', uRelative: -1 } }),
      'negative',
      'facility.blockage.uRelative',
    ],
    ['yaw', { ...yaw, windSpeedMs: 40 }, 'wind-ratio', 'windSpeedMs'],
    ['yaw', { ...yaw, points: [{ ...points[0], uM2: -1 }] }, 'negative', 'points.0.uM2'],
    ['yaw', { ...yaw, points: [] }, 'yaw-too-few-angles', 'points'],
    ['cycle-energy', { ...cycle, massKg: 0 }, 'not-positive', 'massKg'],
    ['cycle-energy', { ...cycle, massKg: null }, 'missing-input', 'massKg'],
    ['cycle-energy', { ...cycle, cycle: null }, 'missing-input', 'cycle'],
    ['cycle-energy', { ...cycle, cycle: 5 }, 'malformed-input', 'cycle'],
    ['cycle-energy', { ...cycle, cycle: 'ftp' }, 'unknown-cycle', 'cycle'],
    ['cycle-energy', { ...cycle, cycle: { timeS: [0, 1] } }, 'missing-input', 'cycle.speedKmh'],
    [
      'cycle-energy',
      { ...cycle, cycle: { constantSpeedKmh: 0, durationS: 9 } },
      'not-positive',
      'cycle.constantSpeedKmh',
    ],
    [
      'cycle-energy',
      { ...cycle, cycle: { timeS: [0, 1], speedKmh: [0, 1], unit: 's' } },
      'malformed-input',
      'cycle.unit',
    ],
    [
      'cycle-energy',
      { ...cycle, cycle: { timeS: [0, 1], speedKmh: [0, 1], constantSpeedKmh: 9 } },
      'malformed-input',
      'cycle.constantSpeedKmh',
    ],
    [
      'budget',
      { figure: { dragAreaM2: 0.6, contributions: [{ key: 'a' }] } },
      'missing-input',
      'figure.contributions.0.amountM2',
    ],
  ])('%s of %j: %s at %s', async (operation, input, code, where) => {
    const problem = await refusalOf(operation, typeof input === 'string' ? input : JSON.stringify(input));
    expect(problem).toMatchObject({ type: `/problems/${code}`, code, where, title: REFUSAL_TITLES[code] });
    expect(problem['status']).toBe(code === 'not-json' || code === 'malformed-input' ? 400 : 422);
    expect(Object.keys(problem).sort()).toEqual(['code', 'detail', 'status', 'title', 'type', 'where']);
  });

  it('null is the same as absent', async () => {
    const withNull = await run(['air'], () => JSON.stringify({ ...air, state: null }));
    expect(withNull).toEqual(await run(['air'], () => JSON.stringify(air)));
  });

  it('an operation that is not built yet is refused by its section, an unknown one as unknown', async () => {
    for (const [name, section] of Object.entries(NOT_YET_AVAILABLE)) {
      expect(await refusalOf(name, '{}')).toMatchObject({
        code: 'not-available',
        status: 501,
        where: `section ${section}`,
      });
    }
    expect(await refusalOf('toString', '{}')).toMatchObject({ code: 'unknown-operation', status: 404 });
  });
});

describe('The schema of an operation', () => {
  it.each(OPERATION_NAMES)('%s is JSON Schema 2020-12 and lets the worked cases pass', async (name) => {
    const answer = await run([name, '--schema'], () => '');
    const schema = JSON.parse(answer.stdout) as Json;
    expect(schema['$schema']).toBe('https://json-schema.org/draft/2020-12/schema');
    const validate = new Ajv2020({ strict: false }).compile(schema);
    const usable = fixture.cases.filter((one) => one.operation === name && !('refusal' in one.expected));
    expect(usable.map((one) => [one.id, validate(one.input)])).toEqual(usable.map((one) => [one.id, true]));
    expect(validate({ something: 'else' })).toBe(false);
  });
});

describe('The command', () => {
  const launcher = join(__dirname, '..', 'method.mjs');
  const call = (args: readonly string[], input = '') => {
    const { stdout, stderr, status } = spawnSync(process.execPath, [launcher, ...args], {
      input,
      encoding: 'utf8',
    });
    return { stdout, stderr, status };
  };

  it('lists its operations, one a line', () => {
    expect(call(['--list'])).toEqual({
      stdout:
        'air\nblockage\nyaw\nreynolds-sweep\nfriction-line\ncorrelation\nbudget\nrank\nreduce\ncycle-energy\npowertrain\ncombine\nplan\nstudent-quantile\n',
      stderr: '',
      status: 0,
    });
  });

  it.each(['air-01-moist', 'cycle-energy-udds', 'rank-22-four-blockage-methods'])(
    'answers %s on standard output as it does in the process',
    async (id) => {
      const one = fixture.cases.find((candidate) => candidate.id === id);
      const input = JSON.stringify(one?.input);
      const inside = await run([one?.operation ?? ''], () => input);
      expect(call([one?.operation ?? ''], input)).toEqual({ stdout: inside.stdout, stderr: '', status: 0 });
    },
  );

  it('waits for an input that comes late, also where reading at once would fail', () => {
    // What touches its standard input turns the pipe that it shares with the command into one that does not wait.
    const parent = `require('node:child_process').spawn(process.execPath, [${JSON.stringify(launcher)}, 'air'], { stdio: 'inherit' });
      process.stdin.pause();`;
    const late = `setTimeout(() => process.stdout.write('{"state":"un-gtr-15"}'), 2000)`;
    const { stdout, stderr } = spawnSync(
      'sh',
      ['-c', '"$0" -e "$1" | "$0" -e "$2"', process.execPath, late, parent],
      {
        encoding: 'utf8',
      },
    );
    expect({ stderr, air: JSON.parse(stdout) as unknown }).toMatchObject({
      stderr: '',
      air: { densityKgM3: 1.189 },
    });
  });

  it('refuses on standard error with exit code 2', () => {
    const { stdout, stderr, status } = call(['air'], '{"temperatureC":20,"pressurePa":101325}');
    expect({ stdout, status }).toEqual({ stdout: '', status: 2 });
    expect(JSON.parse(stderr)).toMatchObject({ code: 'missing-input', where: 'air.relativeHumidity' });
  });
});
