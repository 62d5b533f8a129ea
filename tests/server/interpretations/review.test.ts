import { describe, expect, it } from 'vitest';
import { createInterpretationServer, idOf } from '../../setup/interpretation-server';

const { server, db, survey, geophysicist, hydrogeologist, fittedSounding, draft, tell, told, read } =
  await createInterpretationServer();

describe('review', () => {
  it('goes from draft to accepted, and a newer one takes its place', async () => {
    const given = await fittedSounding();
    const first = await draft(given);
    const submitted = await told(geophysicist, first, 'submitted', { comment: 'Please look.' });
    expect(submitted.state).toBe('in-review');
    expect(submitted.can).toMatchObject({ edit: false, submit: false, withdraw: true });
    expect((await read(hydrogeologist, first)).can.decide).toBe(true);
    const accepted = await told(hydrogeologist, first, 'accepted');
    expect(accepted.state).toBe('accepted');
    expect(accepted.events.map((event) => [event.kind, event.actor.id])).toEqual([
      ['submitted', idOf(geophysicist)],
      ['accepted', idOf(hydrogeologist)],
    ]);
    const second = await draft(given);
    await told(geophysicist, second, 'submitted');
    await told(hydrogeologist, second, 'accepted');
    const superseded = await read(geophysicist, first);
    expect(superseded.state).toBe('superseded');
    expect(superseded.events.at(-1)?.kind).toBe('superseded');
  });

  it('refuses moves that its state does not allow', async () => {
    const made = await draft(await fittedSounding());
    const early = await tell(hydrogeologist, made, 'accepted');
    expect(early.body).toMatchObject({ status: 409, code: 'wrong-state' });
    expect(early.body.detail).toBe('It cannot be accepted: it is a draft.');
    expect((await tell(geophysicist, made, 'withdrawn')).status).toBe(409);
    await told(geophysicist, made, 'submitted');
    expect((await tell(geophysicist, made, 'submitted')).status).toBe(409);
  });

  it('lets nobody who wrote, edited or submitted it decide, whatever role they get later', async () => {
    const writer = await server.signInAs('analyst', survey.id);
    const editor = await server.signInAs('geophysicist', survey.id);
    const submitter = await server.signInAs('geophysicist', survey.id);
    const made = await draft(await fittedSounding(), writer);
    await editor.patch(`/interpretations/${made.id}`, { narrative: 'Sand.' }, 1);
    await told(submitter, made, 'submitted');
    for (const person of [writer, editor, submitter]) {
      await db('survey_member')
        .where({ survey_id: survey.id, user_id: idOf(person) })
        .update({ role: 'hydrogeologist' });
      const seen = await read(person, made);
      expect(seen.can.decide).toBe(false);
      expect(seen.decideRefusal).toMatch(/^You wrote or submitted/);
      for (const kind of ['accepted', 'changes-asked']) {
        const answer = await tell(person, made, kind, { comment: 'Fine.' });
        expect(answer.body).toMatchObject({ status: 403, detail: seen.decideRefusal });
      }
    }
    expect((await read(hydrogeologist, made)).decideRefusal).toBeNull();
  });

  it('lets nobody decide on a run they asked for', async () => {
    const requester = await server.signInAs('geophysicist', survey.id);
    const made = await draft(await fittedSounding(requester));
    await told(geophysicist, made, 'submitted');
    await db('survey_member')
      .where({ user_id: idOf(requester) })
      .update({ role: 'hydrogeologist' });
    const answer = await tell(requester, made, 'accepted');
    expect(answer.status).toBe(403);
    expect(answer.body.detail).toMatch(/^You asked for the run/);
  });

  it('freezes the statement and its run at each submission', async () => {
    const made = await draft(await fittedSounding());
    await told(geophysicist, made, 'submitted');
    await told(hydrogeologist, made, 'changes-asked', { comment: 'Name it better.' });
    const { version } = await read(geophysicist, made);
    await geophysicist.patch(`/interpretations/${made.id}`, { title: 'Better name' }, version);
    await told(geophysicist, made, 'submitted');
    const events = await db('review_event').where({ interpretation_id: made.id }).orderBy('id');
    const snapshots = events.filter((event) => event.snapshot).map((event) => event.snapshot);
    expect(snapshots.map((one) => one.title)).toEqual(['Sand over clay', 'Better name']);
    expect(snapshots[0].beds).toEqual(made.beds);
    expect(snapshots[0].run).toMatchObject({ runId: made.runId, result: { engine: expect.any(String) } });
    expect(snapshots[0].run.input.readings).toHaveLength(12);
  });

  it('asks for words with a request for changes', async () => {
    const made = await draft(await fittedSounding());
    await told(geophysicist, made, 'submitted');
    const answer = await tell(hydrogeologist, made, 'changes-asked', { comment: ' ' });
    expect(answer.body).toMatchObject({ status: 422, faults: [{ path: ['body', 'comment'] }] });
  });

  it('refuses a decision on another version than the one that was read', async () => {
    const made = await draft(await fittedSounding());
    const seen = await told(geophysicist, made, 'submitted');
    await told(geophysicist, made, 'withdrawn');
    await told(geophysicist, made, 'submitted');
    const stale = await tell(hydrogeologist, made, 'accepted', { version: seen.version });
    expect(stale.body).toMatchObject({ status: 409, code: 'conflict', current: { state: 'in-review' } });
    await told(hydrogeologist, made, 'accepted', { version: seen.version + 2 });
  });

  it('accepts one after the other at the same moment, so that one stands', async () => {
    const given = await fittedSounding();
    const all = await Promise.all(Array.from({ length: 6 }, () => draft(given)));
    await Promise.all(all.map((one) => told(geophysicist, one, 'submitted')));
    await Promise.all(all.map((one) => told(hydrogeologist, one, 'accepted')));
    const states = await Promise.all(all.map(async (one) => (await read(geophysicist, one)).state));
    expect(states.filter((state) => state === 'accepted')).toHaveLength(1);
    expect(states.filter((state) => state === 'superseded')).toHaveLength(5);
  });

  it('takes comments in every state and leaves the state alone', async () => {
    const made = await draft(await fittedSounding());
    const after = await told(hydrogeologist, made, 'commented', { comment: 'Which clay?' });
    expect(after).toMatchObject({ state: 'draft', version: 1, events: [{ comment: 'Which clay?' }] });
  });
});
