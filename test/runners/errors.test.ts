/** The table of refusals: every row is complete, names its next step where there is one, and has a documented status. */
import { describe, expect, it } from 'vitest';
import { ERRORS, type ErrorCode, Refusal, refusal, STATUS } from '../../runners/errors.ts';

const codes = Object.keys(ERRORS) as ErrorCode[];

describe('the table of errors', () => {
  it.each(codes)('%s fills in every value it names and keeps to a known status', (code) => {
    const [status, text] = ERRORS[code];
    const names = [...text.matchAll(/\{(\w+)\}/g)].map((found) => found[1] ?? '');
    const error = refusal(code, Object.fromEntries(names.map((name) => [name, `<${name}>`])));
    expect(error).toBeInstanceOf(Refusal);
    expect(error.status).toBe(status);
    expect(error.message).not.toMatch(/\{\w+\}/);
    for (const name of names) expect(error.message).toContain(`<${name}>`);
    expect(Object.values(STATUS)).toContain(status);
  });

  it('leaves a value that was not given visible instead of inventing one', () => {
    expect(refusal('file-missing', { file: 'a.yaml' }).message).toBe('a.yaml: no such file; give the path of {what}');
  });
});
