import { describe, expect, it } from 'vitest';
import type { RunSummary } from '../../../server/contract/runs';
import { createRun } from '../../setup/run-factory';
import { createRunServer } from '../../setup/run-server';

const { db, geophysicist, authorId, measured } = await createRunServer();

describe('what stands on a run', () => {
  it('is told by the weightiest state of its interpretations', async () => {
    const soundingId = await measured();
    const [run, other] = [
      await createRun(db, soundingId, { requestedBy: authorId }),
      await createRun(db, soundingId, { requestedBy: authorId }),
    ];
    const told = async () => {
      const list = await geophysicist.get(`/soundings/${soundingId}/runs`);
      return list.body.items.map((one: RunSummary) => [one.id, one.interpretedAs]);
    };
    expect(await told()).toEqual([
      [other.id, null],
      [run.id, null],
    ]);
    const states = [
      'superseded',
      'draft',
      'accepted',
      'draft',
      'changes-asked',
      'accepted',
      'in-review',
      'draft',
    ];
    const seen: unknown[] = [];
    for (const state of states) {
      await db('interpretation').where({ run_id: run.id, state: 'accepted' }).update({ state: 'superseded' });
      await db('interpretation').insert({
        sounding_id: soundingId,
        run_id: run.id,
        author_id: authorId,
        title: state,
        state,
      });
      seen.push((await told())[1]?.[1]);
    }
    expect(seen).toEqual([
      null,
      'draft',
      'accepted',
      'draft',
      'changes-asked',
      'changes-asked',
      'in-review',
      'in-review',
    ]);
    expect(await told()).toContainEqual([other.id, null]);
    expect((await geophysicist.get(`/runs/${run.id}`)).body).toMatchObject({ interpretedAs: 'in-review' });
  });
});

describe('the note of a run', () => {
  it('is kept beside the run, guarded by its version', async () => {
    const run = await createRun(db, await measured(), { requestedBy: authorId });
    const path = `/runs/${run.id}/note`;
    const first = await geophysicist.patch(path, { label: 'wet top', pinned: true }, 1);
    expect(first.body.note).toEqual({ label: 'wet top', note: '', pinned: true, version: 2 });
    const stale = await geophysicist.patch(path, { note: 'Other.' }, 1);
    expect(stale.body).toMatchObject({ status: 409, current: { note: { label: 'wet top', version: 2 } } });
    const second = await geophysicist.patch(path, { note: 'Mine.' }, 2);
    expect(second.body.note).toEqual({ label: 'wet top', note: 'Mine.', pinned: true, version: 3 });
  });
});
