import { countJest, lastLine, total } from './counting.mjs';

// The names of the fields are those of jest's own --json report.
const report = (fields) => ({
  numPassedTests: 0,
  numFailedTests: 0,
  numPendingTests: 0,
  numTodoTests: 0,
  numRuntimeErrorTestSuites: 0,
  ...fields,
});

describe('counting', () => {
  it('takes a run in which all passed as it is', () => {
    expect(countJest(report({ numPassedTests: 7 }), 0)).toEqual({ passed: 7, failed: 0, notes: [] });
  });

  it.each([
    ['a suite that could not run', report({ numPassedTests: 7, numRuntimeErrorTestSuites: 1 }), 1, 1],
    ['a skipped test', report({ numPassedTests: 7, numPendingTests: 2 }), 0, 2],
    ['a test yet to be written', report({ numPassedTests: 7, numTodoTests: 1 }), 0, 1],
    ['no test at all', report({}), 0, 1],
    ['a bad exit code', report({ numPassedTests: 7 }), 1, 1],
    ['no report', null, 0, 1],
  ])('counts %s as failed', (_, jestReport, exitCode, failed) => {
    expect(countJest(jestReport, exitCode).failed).toBe(failed);
  });

  it('adds up, and is only right when something passed and nothing failed', () => {
    expect(total([{ passed: 3, failed: 0 }, { passed: 4, failed: 1 }])).toEqual({ passed: 7, failed: 1, ok: false });
    expect(total([{ passed: 3, failed: 0 }]).ok).toBe(true);
    expect(total([]).ok).toBe(false);
    expect(lastLine(total([{ passed: 3, failed: 2 }]))).toBe('3 passed, 2 failed');
  });
});
