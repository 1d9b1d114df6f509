import { BadRequestException, NotFoundException } from '@nestjs/common';
import { IllegalMove, ScopeRefused, SubjectNotFound } from '@quarterpoise/database';
import { describe, expect, it } from 'vitest';
import { loggableError } from './loggable-error.js';
import { ProblemException } from './problem.exception.js';
import { problemOf } from './problem-of.js';

const withCode = (code: string, message = 'boom') => Object.assign(new Error(message), { code });

describe('problemOf', () => {
  it.each([
    [new ProblemException('own-account'), 'own-account', 403],
    [new IllegalMove('run', 'completed', 'cancelled', 'The run has ended.'), 'illegal-move', 409],
    [new SubjectNotFound('no run'), 'not-found', 404],
    [new ScopeRefused({ kind: 'relay' }), 'forbidden', 403],
    [withCode('QP001', 'second person needed'), 'second-person-needed', 403],
    [new NotFoundException(), 'not-found', 404],
    [new BadRequestException(), 'malformed-request', 400],
    [Object.assign(new Error('Body is not valid JSON'), { statusCode: 400 }), 'malformed-request', 400],
    [withCode('ECONNREFUSED'), 'service-unavailable', 503],
    [withCode('57P01'), 'service-unavailable', 503],
    [withCode('40001'), 'service-unavailable', 503],
    [new AggregateError([withCode('ECONNREFUSED')]), 'service-unavailable', 503],
    [new Error('wrapped', { cause: withCode('08006') }), 'service-unavailable', 503],
  ])('%s', (error, code, status) => {
    expect(problemOf(error)).toMatchObject({ code, status });
  });

  it('gives the reason of a refused move', () => {
    expect(problemOf(new IllegalMove('run', 'a', 'b', 'The run has ended.'))!.message).toBe('The run has ended.');
  });

  it('does not take an unforeseen error for anything', () => {
    expect(problemOf(new TypeError('x is not a function'))).toBeNull();
    expect(problemOf(withCode('23505'))).toBeNull();
    expect(problemOf('text')).toBeNull();
  });
});

describe('loggableError', () => {
  it('keeps values of statements out of the log', () => {
    const error = withCode('23505', `insert into participant values ('Ada Alder')`);
    expect(JSON.stringify(loggableError(error))).not.toContain('Ada');
    expect(loggableError(error)).toMatchObject({ code: '23505' });
    expect(JSON.stringify(loggableError(new Error('outer', { cause: error })))).not.toContain('Ada');
  });

  it('keeps the message of any other error, and where it happened', () => {
    expect(loggableError(new TypeError('x is not a function'))).toMatchObject({
      type: 'TypeError',
      message: 'x is not a function',
      frames: expect.arrayContaining([expect.stringContaining('problem-of.spec.ts')]),
    });
  });
});
