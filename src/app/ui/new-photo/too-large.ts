import type { Problem } from '../../../../shared/contract/problem';

/** What is said of a file that is larger than the site takes; told before it is sent. */
export function tooLarge(file: File): Problem {
  const megabytes = (file.size / 1024 / 1024).toFixed(1);
  return {
    type: '/problems/body-too-large',
    title: 'The photo is too large',
    status: 413,
    detail: `“${file.name}” has ${megabytes} MB.`,
    remedy: 'Make it smaller than 20 MB and choose it again.',
  };
}
