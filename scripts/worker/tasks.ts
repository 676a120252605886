// What the worker can do: each domain's `lib/<domain>/work.ts`, listed by hand so that a missing one is seen in review.
// Add a domain: import its `work` here and put it into the list.
import * as bookings from '../../lib/bookings/work';
import * as books from '../../lib/books/work';
import * as club from '../../lib/club/work';
import * as letters from '../../lib/letters/work';

/** What `lib/<domain>/work.ts` exports: what is done for each job, and what looks every 15 seconds for rows that are due. */
export type Work = {
  tasks: Record<string, (payload: unknown) => Promise<void>>;
  sweeps?: (() => Promise<void>)[];
};

const domains: Work[] = [bookings, books, club, letters];

/** Every domain's tasks by name; two domains with one name is a mistake that stops the worker. */
export function allTasks(): Work['tasks'] {
  const tasks: Work['tasks'] = {};
  for (const [name, task] of domains.flatMap((work) => Object.entries(work.tasks))) {
    if (name in tasks) throw new Error(`Two domains have a task called ${name}.`);
    tasks[name] = task;
  }
  return tasks;
}

/** Every domain's sweeps, in the order of the list. */
export const allSweeps = (): (() => Promise<void>)[] => domains.flatMap((work) => work.sweeps ?? []);
