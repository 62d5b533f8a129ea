import { describe, expect, it } from 'vitest';
import { interpretationSchema, type Interpretation } from '../../server/contract/interpretations';
import { createRun } from '../setup/run-factory';
import { createTestServer, type Client } from '../setup/server';

const server = await createTestServer();
const { db } = server;
const survey = await server.createSurvey();
const geophysicist = await server.signInAs('geophysicist', survey.id);
const hydrogeologist = await server.signInAs('hydrogeologist', survey.id);
const idOf = (client: Client): string => client.user?.id ?? '';

async function fittedSounding(requester: Client = geophysicist, layers = 3) {
  const sounding = await server.createSounding(survey.id);
  await server.createRevision(sounding.id, idOf(geophysicist));
  const run = await createRun(db, sounding.id, {
    requestedBy: idOf(requester),
    settings: { kind: 'layered', layers },
  });
  return { soundingId: sounding.id, runId: run.id };
}

async function draft(given: { soundingId: string; runId: string }, author: Client = geophysicist) {
  const made = await author.post(`/soundings/${given.soundingId}/interpretations`, {
    runId: given.runId,
    title: 'Sand over clay',
  });
  expect(made).toMatchObject({ status: 201 });
  return interpretationSchema.parse(made.body);
}

const tell = (client: Client, { id }: Interpretation, kind: string, more: object = {}) =>
  client.post(`/interpretations/${id}/review-events`, { kind, ...more });

async function told(client: Client, one: Interpretation, kind: string, more: object = {}) {
  const answer = await tell(client, one, kind, more);
  expect(answer).toMatchObject({ status: 201 });
  return interpretationSchema.parse(answer.body);
}

const read = async (client: Client, { id }: Interpretation) =>
  interpretationSchema.parse((await client.get(`/interpretations/${id}`)).body);

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
  });

  it('lists the newest first', async () => {
    const given = await fittedSounding();
    const [older, newer] = [await draft(given), await draft(given)];
    const list = await hydrogeologist.get(`/soundings/${given.soundingId}/interpretations`);
    expect(list.body.items.map((one: Interpretation) => one.id)).toEqual([newer.id, older.id]);
  });
});

describe('editing', () => {
  it('keeps what is written, bed by bed', async () => {
    const made = await draft(await fittedSounding());
    const bed = {
      layerIndex: 1,
      ground: 'wet clay',
      role: 'aquitard',
      confidence: 'likely',
      otherCandidates: 'brackish sand',
    };
    const answer = await geophysicist.patch(
      `/interpretations/${made.id}`,
      { narrative: 'Clay between sands.', waterLevelDepthM: 4.25, beds: [bed] },
      1,
    );
    expect(answer.status).toBe(200);
    expect(answer.headers.etag).toBe('"2"');
    const after = await read(geophysicist, made);
    expect(after).toMatchObject({ narrative: 'Clay between sands.', waterLevelDepthM: 4.25, version: 2 });
    expect(after.title).toBe('Sand over clay');
    expect(after.beds[1]).toEqual(bed);
    expect(after.beds[0]).toEqual(made.beds[0]);
  });

  it('refuses beds that are no layers of the run, or come twice', async () => {
    const made = await draft(await fittedSounding());
    const bed = (layerIndex: number) => ({ ...made.beds[0], layerIndex });
    const answer = await geophysicist.patch(
      `/interpretations/${made.id}`,
      { beds: [bed(0), bed(3), bed(0)] },
      1,
    );
    expect(answer.status).toBe(422);
    expect(answer.body.faults).toMatchObject([
      { path: ['body', 'beds', 1, 'layerIndex'], found: '3', allowed: '0 to 2, each once' },
      { path: ['body', 'beds', 2, 'layerIndex'], message: 'is given twice' },
    ]);
  });

  it('tells of an edit by someone else and loses neither', async () => {
    const made = await draft(await fittedSounding());
    await geophysicist.patch(`/interpretations/${made.id}`, { title: 'First' }, 1);
    const answer = await geophysicist.patch(`/interpretations/${made.id}`, { title: 'Second' }, 1);
    expect(answer.body).toMatchObject({
      status: 409,
      code: 'conflict',
      current: { title: 'First', version: 2 },
    });
  });

  it('is refused from submission until it comes back', async () => {
    const made = await draft(await fittedSounding());
    const edit = async () => {
      const { version } = await read(geophysicist, made);
      return (await geophysicist.patch(`/interpretations/${made.id}`, { title: 'Other' }, version)).status;
    };
    await told(geophysicist, made, 'submitted');
    expect(await edit()).toBe(409);
    await told(geophysicist, made, 'withdrawn');
    expect(await edit()).toBe(200);
    await told(geophysicist, made, 'submitted');
    await told(hydrogeologist, made, 'changes-asked', { comment: 'Where is the water?' });
    expect(await edit()).toBe(200);
    await told(geophysicist, made, 'submitted');
    await told(hydrogeologist, made, 'accepted');
    expect(await edit()).toBe(409);
  });
});

describe('editing by others', () => {
  const edit = async (client: Client, one: Interpretation, title: string) => {
    const { version } = await read(client, one);
    return client.patch(`/interpretations/${one.id}`, { title }, version);
  };

  it('is for those who may submit; an analyst edits only what they began', async () => {
    const [analyst, colleague] = [
      await server.signInAs('analyst', survey.id),
      await server.signInAs('analyst', survey.id),
    ];
    const given = await fittedSounding();
    const theirs = await draft(given, analyst);
    expect((await edit(analyst, theirs, 'Mine')).status).toBe(200);
    expect((await edit(geophysicist, theirs, 'Better')).status).toBe(200);
    const ours = await draft(given);
    for (const one of [theirs, ours]) {
      const refused = await edit(colleague, one, 'Other');
      expect(refused.body).toMatchObject({ status: 403, code: 'forbidden' });
      expect(refused.body.detail).toContain(`this one is ${one.author.name}’s`);
      expect((await read(colleague, one)).can.edit).toBe(false);
      expect((await read(geophysicist, one)).can.edit).toBe(true);
    }
    expect((await read(analyst, theirs)).can.edit).toBe(true);
  });

  it('leaves one line for each stretch of edits by one person, and none for the author', async () => {
    const made = await draft(await fittedSounding());
    const other = await server.signInAs('geophysicist', survey.id);
    const lead = await server.signInAs('lead', survey.id);
    for (const person of [geophysicist, other, other, lead, lead, other]) await edit(person, made, 'Again');
    await told(hydrogeologist, made, 'commented', { comment: 'Which clay?' });
    await edit(other, made, 'Grey clay');
    const { events } = await read(geophysicist, made);
    expect(events.map((event) => [event.kind, event.actor.id])).toEqual([
      ['edited', idOf(other)],
      ['edited', idOf(lead)],
      ['edited', idOf(other)],
      ['commented', idOf(hydrogeologist)],
      ['edited', idOf(other)],
    ]);
    expect(events[0]?.actor.name).toBe(other.user?.name);
  });

  it('leaves no line where nothing was changed', async () => {
    const made = await draft(await fittedSounding());
    const other = await server.signInAs('geophysicist', survey.id);
    expect((await other.patch(`/interpretations/${made.id}`, { title: 'Late' }, 7)).status).toBe(409);
    expect((await read(geophysicist, made)).events).toEqual([]);
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
