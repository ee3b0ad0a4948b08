import type { z } from 'zod';
import type { FieldProblem } from '../../shared/contract/problem.js';

/**
 * Issues of a schema as fields with a message that reads on from the field's name and, where the schema says what
 * would be taken, a remedy. Messages that a schema words itself are kept.
 */
export function fieldProblems(issues: readonly z.core.$ZodIssue[]): FieldProblem[] {
  return issues.flatMap((issue) => fieldProblemsOf(issue));
}

function fieldProblemsOf(issue: z.core.$ZodIssue): FieldProblem[] {
  const path = issue.path.join('.');
  switch (issue.code) {
    case 'unrecognized_keys':
      return issue.keys.map((key) => ({
        path: [...issue.path, key].join('.'),
        message: 'is not a field here',
        remedy: 'Leave it out.',
      }));
    case 'invalid_type':
      if (!issue.message.startsWith('Invalid input')) break;
      return [
        issue.message.endsWith('received undefined')
          ? { path, message: 'is missing', remedy: `Send it as ${withArticle(issue.expected)}.` }
          : {
              path,
              message: `is not ${withArticle(issue.expected)}`,
              remedy: `Send ${withArticle(issue.expected)}.`,
            },
      ];
    case 'invalid_value':
      return [
        {
          path,
          message: 'is none of the values taken here',
          remedy: `Send one of: ${issue.values.join(', ')}.`,
        },
      ];
    case 'too_small':
      if (!issue.message.startsWith('Too small')) break;
      return [{ path, message: `is less than ${bound(issue.minimum, issue.origin)}`, remedy: 'Send more.' }];
    case 'too_big':
      if (!issue.message.startsWith('Too big')) break;
      return [{ path, message: `is more than ${bound(issue.maximum, issue.origin)}`, remedy: 'Send less.' }];
  }
  return [{ path, message: issue.message }];
}

const units: Record<string, string> = { array: ' entries', string: ' characters' };

function bound(limit: number | bigint, origin: string): string {
  return `${limit}${units[origin] ?? ''}`;
}

function withArticle(expected: string): string {
  if (expected === 'int') return 'a whole number';
  if (expected === 'null') return 'null';
  return /^[aeiou]/.test(expected) ? `an ${expected}` : `a ${expected}`;
}
