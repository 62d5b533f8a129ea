import { describe, expect, it } from 'vitest';
import type { Interpretation } from '../../../server/contract/interpretations';
import { createInterpretationServer, idOf } from '../../setup/interpretation-server';
import { createRun } from '../../setup/run-factory';
import type { Client } from '../../setup/server';

const { server, db, survey, geophysicist, hydrogeologist, fittedSounding, draft, told, read } =
  await createInterpretationServer();

describe('beginning an interpretation', () => {
  it('makes one bed for each layer of the run', async () => {
    const made = await draft(await fittedSounding(geophysicist, 4));
    expect(made.beds.map((bed) => [bed.layerIndex, bed.role, bed.confidence, bed.ground])).toEqual(
      [0, 1, 2, 3].map((layer) => [layer, 'unknown', 'unstated', '']),
    );
    expect(made).toMatchObject({ state: 'draft', version: 1, events: [], runNumber: 1 });
    expect(made.can).toEqual({
      edit: true,
      submit: true,
      withdraw: false,
      decide: false,
      comment: true,
      discard: true,
    });
  });

  it('takes only a finished run of the same sounding', async () => {
    const [here, elsewhere] = [await fittedSounding(), await fittedSounding()];
    const path = `/soundings/${here.soundingId}/interpretations`;
    const foreign = await geophysicist.post(path, { runId: elsewhere.runId, title: 'Sand' });
    expect(foreign.body).toMatchObject({ status: 422, faults: [{ path: ['body', 'runId'] }] });
    const waiting = await createRun(db, here.soundingId, {
      requestedBy: idOf(geophysicist),
      finished: false,
    });
    const early = await geophysicist.post(path, { runId: waiting.id, title: 'Sand' });
    expect(early.body).toMatchObject({ status: 409, code: 'wrong-state' });
    expect(early.body.detail).toContain('queued');
    const smooth = await createRun(db, here.soundingId, {
      requestedBy: idOf(geophysicist),
      settings: { kind: 'smooth' },
    });
    const cells = await geophysicist.post(path, { runId: smooth.id, title: 'Sand' });
    expect(cells.body).toMatchObject({ status: 422, faults: [{ path: ['body', 'runId'] }] });
    expect(cells.body.detail).toContain('Cells are no beds');
  });

  it('lists the newest first', async () => {
    const given = await fittedSounding();
    const [older, newer] = [await draft(given), await draft(given)];
    const list = await hydrogeologist.get(`/soundings/${given.soundingId}/interpretations`);
    expect(list.body.items.map((one: Interpretation) => one.id)).toEqual([newer.id, older.id]);
  });
});

describe('discarding', () => {
  const discard = (client: Client, { id }: Interpretation) => client.delete(`/interpretations/${id}`);

  it('is for its author, or a lead', async () => {
    const given = await fittedSounding();
    const [lead, other] = [
      await server.signInAs('lead', survey.id),
      await server.signInAs('geophysicist', survey.id),
    ];
    const [mine, theirs] = [await draft(given), await draft(given)];
    const refused = await discard(other, mine);
    expect(refused.body).toMatchObject({
      status: 403,
      detail: 'Only its author or a lead of the survey may discard an interpretation.',
    });
    expect((await read(other, mine)).can.discard).toBe(false);
    expect((await read(lead, theirs)).can.discard).toBe(true);
    expect((await discard(geophysicist, mine)).status).toBe(204);
    expect((await discard(lead, theirs)).status).toBe(204);
    expect((await discard(lead, theirs)).status).toBe(404);
    const list = await geophysicist.get(`/soundings/${given.soundingId}/interpretations`);
    expect(list.body.items).toEqual([]);
    const audited = await db('audit_event').where({ action: 'interpretation.discarded' }).orderBy('at');
    expect(audited.map((event) => [event.actor_id, event.details.interpretationId])).toEqual([
      [idOf(geophysicist), mine.id],
      [idOf(lead), theirs.id],
    ]);
  });

  it('is refused once there is a history, which is kept', async () => {
    const given = await fittedSounding();
    const inReview = await draft(given);
    await told(geophysicist, inReview, 'submitted');
    const cameBack = await draft(given);
    await told(geophysicist, cameBack, 'submitted');
    await told(geophysicist, cameBack, 'withdrawn');
    const spokenOf = await draft(given);
    await told(hydrogeologist, spokenOf, 'commented', { comment: 'Which clay?' });
    for (const [one, detail] of [
      [inReview, 'It cannot be discarded: it is in review.'],
      [cameBack, 'It cannot be discarded: it was submitted once, and what was submitted is kept.'],
      [spokenOf, 'It cannot be discarded: it was commented on or edited by others, and its history is kept.'],
    ] as const) {
      expect((await read(geophysicist, one)).can.discard).toBe(false);
      expect((await discard(geophysicist, one)).body).toMatchObject({
        status: 409,
        code: 'wrong-state',
        detail,
      });
    }
  });
});
