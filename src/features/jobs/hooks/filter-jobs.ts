import type { Job } from '#shared/schemas/jobs.ts';

/** Jobs whose number, name or customer has every word that was typed. */
export function filterJobs(jobs: readonly Job[], text: string): Job[] {
  const words = text.toLowerCase().split(/\s+/).filter(Boolean);
  return jobs.filter(({ number, name, customer }) => {
    const said = `${number} ${name} ${customer}`.toLowerCase();
    return words.every((word) => said.includes(word));
  });
}
