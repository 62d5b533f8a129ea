import { pino } from 'pino';
import { expect, test } from 'vitest';
import { createBackgroundTasks } from '../../server/background-tasks';

test('a failure is logged and holds nothing up; idle waits for all, also for work that work begins', async () => {
  const lines: string[] = [];
  const background = createBackgroundTasks(pino({}, { write: (line: string) => lines.push(line) }));
  const done: string[] = [];
  background.run('sending', () => Promise.reject(new Error('no route')));
  background.run('first', async () => {
    await new Promise((resolve) => setImmediate(resolve));
    background.run('second', async () => {
      await new Promise((resolve) => setImmediate(resolve));
      done.push('second');
    });
    done.push('first');
  });
  await background.idle();
  expect(done).toEqual(['first', 'second']);
  expect(lines).toHaveLength(1);
  expect(lines[0]).toContain('"msg":"sending failed"');
  expect(lines[0]).toContain('no route');
});
