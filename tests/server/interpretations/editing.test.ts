import { describe, expect, it } from 'vitest';
import type { Interpretation } from '../../../server/contract/interpretations';
import { createInterpretationServer, idOf } from '../../setup/interpretation-server';
import type { Client } from '../../setup/server';

const { server, survey, geophysicist, hydrogeologist, fittedSounding, draft, told, read } =
  await createInterpretationServer();

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
