import { CALCULATOR_NAMES } from '../src/calculators/registry.js';
import { makeWorld, type World } from './factories/world.js';
import { startTestApp, type TestApp } from './support/test-app.js';

type Body = Record<string, unknown>;

describe('calculators', () => {
  let test: TestApp;
  let world: World;

  beforeAll(async () => {
    test = await startTestApp();
    world = await makeWorld(test);
  });
  afterAll(() => test.close());

  const ask = (name: string, body: unknown) =>
    test.http().post(`/api/calculators/${name}`).set(world.people.observer.auth).send(body as object);

  // One worked example a calculator over HTTP; the full tables stand beside the functions.
  const EXAMPLES: [name: string, source: string, body: Body, answer: Body][] = [
    [
      'infection-2018',
      'Parvizi J et al. J Arthroplasty 2018;33:1309, worked from the published table',
      { variant: 'original', timing: 'chronic', crpMgL: 24, esrMmH: 45, synovialWbcPerUl: 4200, pmnPercent: 85 },
      { preoperativeScore: 8, totalScore: 8, verdict: 'infected' },
    ],
    [
      'infection-2018',
      'consensus version, Shohat N et al. 2019: alpha-defensin shares the line of the white cell count',
      { variant: 'consensus', timing: 'chronic', synovialWbcPerUl: 3500, alphaDefensin: true },
      { totalScore: 3, verdict: 'inconclusive' },
    ],
    ['infection-2013', 'International consensus 2013, three of five minor criteria', { timing: 'chronic', crpMgL: 24, esrMmH: 45, synovialWbcPerUl: 4200, pmnPercent: 85 }, { criteriaMet: 3, verdict: 'infected' }],
    [
      'acetabular-defect',
      'Paprosky WG et al. J Arthroplasty 1994;9:33: 25 mm is IIIA at 2 cm; IIB at the later 3 cm (from memory)',
      { migrationMm: 25, direction: 'superolateral', ischialLysis: 'moderate', teardrop: 'partial', kohler: 'intact', rule: 20 },
      { class: 'IIIA', otherRule: 'IIB' },
    ],
    ['cup-ellipse', 'arcsine of minor over major axis (Lewinnek, from memory)', { majorPx: 48, minorPx: 24 }, { anteversionDeg: expect.closeTo(30, 9) }],
    ['calibration', 'elementary proportion', { trueMm: 32, measuredPx: 192, lengthsPx: [270, 222] }, { lengthsMm: [45, 37] }],
    ['removal-geometry', 'volume of a hemispherical layer, elementary geometry', { shellOuterMm: 54, nextShellMm: 58 }, { radialMm: 2, boneCm3: expect.closeTo(9.856, 3) }],
    ['panel', 'panel of 15 published in PMC3467596', { ratings: [1, 3, 6, 7, 7, 7, 7, 7, 8, 8, 8, 8, 8, 9, 9] }, { median: 7, ipr: 1, ipras: expect.closeTo(6.1, 9), verdict: 'appropriate' }],
    ['agreement', 'statsmodels tests/test_inter_rater.py', { method: 'fleiss-kappa', counts: [[6, 1, 0], [0, 7, 0]] }, { value: expect.closeTo(0.708333, 6) }],
    ['ranking', 'Tennessee example, from memory', { ballots: [['M', 'N', 'C', 'K', 42], ['N', 'C', 'K', 'M', 26], ['C', 'K', 'N', 'M', 15], ['K', 'C', 'N', 'M', 17]].map((row) => ({ count: row[4], order: row.slice(0, 4).map((name) => [name]) })) }, { condorcetWinner: 'N', ranking: [['N'], ['C'], ['K'], ['M']] }],
    ['proportion', 'Newcombe RG. Stat Med 1998;17:857, Table I, method 3', { successes: 81, n: 263 }, { low: expect.closeTo(0.2553, 4), high: expect.closeTo(0.3662, 4) }],
    ['agenda-fill', 'public knapsack set P02', { minutes: 26, items: [[12, 24], [7, 13], [11, 23], [8, 15], [9, 16]].map(([minutes, priority], index) => ({ id: `${index + 1}`, minutes, priority })) }, { chosen: ['2', '3', '4'], priority: 51, usedMinutes: 26 }],
    ['meeting-dates', 'RFC 5545 3.3.5: a time that the clocks skip takes the offset before the gap', { timeZone: 'America/New_York', start: '2007-03-11T02:30', rrule: 'FREQ=WEEKLY', count: 1 }, { utc: ['2007-03-11T07:30:00.000Z'] }],
    ['charlson', 'Charlson ME et al. J Chronic Dis 1987;40:373: nested pairs count once', { conditions: ['diabetes', 'diabetes-with-end-organ-damage'], ageYears: 72 }, { score: 2, ageAdjusted: 5 }],
    ['cup-orientation', 'Murray DW. JBJS Br 1993;75-B:228, derived from its definitions', { from: 'radiographic', inclinationDeg: 40, anteversionDeg: 15 }, { operative: { inclinationDeg: expect.closeTo(38.381, 3), anteversionDeg: expect.closeTo(19.279, 3) } }],
    ['identifier-screen', 'NHS number with a valid check digit, python-stdnum gb.nhs', { text: 'NHS 943 476 5870' }, { findings: [expect.objectContaining({ strength: 'certain', text: '943 476 5870' })] }],
  ];

  it.each(EXAMPLES)('%s: %s', async (name, _, body, answer) => {
    const response = await ask(name, body);
    expect(response.status).toBe(200);
    expect(response.body).toMatchObject(answer);
    expect(response.body.definition).toEqual(expect.any(String));
    expect(response.body.cautions).toEqual(expect.any(Array));
  });

  it('has an example of every calculator above', () => {
    expect([...new Set(EXAMPLES.map(([name]) => name))].sort()).toEqual([...CALCULATOR_NAMES].sort());
  });

  it.each(CALCULATOR_NAMES.map((name) => [name]))('%s refuses an unknown field by its name', async (name) => {
    const { status, body } = await ask(name, { patientName: 'x' });
    expect(status).toBe(422);
    expect(body.errors[0]).toMatchObject({ field: 'patientName', code: 'unknown-field' });
  });

  it.each([
    ['text where a number belongs', 'infection-2018', { variant: 'original', timing: 'chronic', crpMgL: '24' }, 'crpMgL'],
    ['a negative value', 'infection-2018', { variant: 'original', timing: 'chronic', crpMgL: -1 }, 'crpMgL'],
    ['the original definition for an acute case', 'infection-2018', { variant: 'original', timing: 'acute' }, 'timing'],
    ['a next shell smaller than the shell', 'removal-geometry', { shellOuterMm: 54, nextShellMm: 50 }, 'nextShellMm'],
    ['a minor axis longer than the major', 'cup-ellipse', { majorPx: 10, minorPx: 11 }, 'minorPx'],
    ['a rating of 10', 'panel', { ratings: [1, 10] }, 'ratings[1]'],
    ['a zone that does not exist', 'meeting-dates', { timeZone: 'Mars/North', start: '2026-01-07T07:30', rrule: 'FREQ=WEEKLY', count: 2 }, 'timeZone'],
    ['a rule that recurs each second', 'meeting-dates', { timeZone: 'UTC', start: '2026-01-07T07:30', rrule: 'FREQ=SECONDLY', count: 2 }, 'rrule'],
  ])('refuses %s by field', async (_, name, body, field) => {
    const response = await ask(name, body);
    expect(response.status).toBe(422);
    expect(response.headers['content-type']).toContain('application/problem+json');
    expect(response.body.errors[0].field).toBe(field);
  });

  it('refuses a body that is no object, a calculator that does not exist, and a stranger', async () => {
    expect((await ask('panel', [1, 2])).status).toBe(422);
    expect((await ask('tarot', {})).status).toBe(404);
    expect((await ask('constructor', {})).status).toBe(404);
    expect((await test.http().post('/api/calculators/panel').send({ ratings: [5] })).status).toBe(401);
  });

  it('answers not known where nothing is known, never negative', async () => {
    const { body } = await ask('infection-2018', { variant: 'original', timing: 'chronic', crpMgL: null });
    expect(body.verdict).not.toBe('not-infected');
    expect(body.missing).toEqual(expect.arrayContaining(['crpMgL', 'synovialWbcPerUl']));
  });
});
