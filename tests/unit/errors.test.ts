import { describe, expect, it } from 'vitest';
import { AppError, problemOf, problemResponse } from '@/lib/errors';

describe('problemOf', () => {
  it('tells status, title, detail and the place of the fault', () => {
    const error = new AppError('invalid', 'The file was refused.', {
      faults: [{ reason: 'not a number', field: 'x_mm', line: 3, column: 1 }],
    });
    expect(problemOf(error)).toEqual({
      type: 'about:blank',
      title: 'Unprocessable Content',
      status: 422,
      detail: 'The file was refused.',
      faults: [{ reason: 'not a number', field: 'x_mm', line: 3, column: 1 }],
    });
  });
  it('is 503 where the database is shutting down, starting up or gone (PostgreSQL documentation, appendix A)', () => {
    for (const code of ['57P01', '57P03', '08006', 'ECONNREFUSED']) {
      expect(problemOf(Object.assign(new Error('inside'), { code })).status).toBe(503);
    }
    expect(problemOf(new Error('Connection terminated unexpectedly')).status).toBe(503);
    expect(problemOf(Object.assign(new Error('inside'), { code: '23505' })).status).toBe(500);
    expect(problemOf(null).status).toBe(500);
  });
  it('tells nothing of the inside for what was not thrown on purpose', () => {
    const problem = problemOf(new Error('select secret from somewhere'));
    expect(problem.status).toBe(500);
    expect(JSON.stringify(problem)).not.toContain('secret');
  });
});

describe('problemResponse', () => {
  it('has the media type of RFC 9457 §6.1', async () => {
    const response = problemResponse(new AppError('not-found', 'No such wafer.'));
    expect(response.status).toBe(404);
    expect(response.headers.get('content-type')).toBe('application/problem+json');
    expect(await response.json()).toMatchObject({ status: 404, detail: 'No such wafer.' });
  });
});
