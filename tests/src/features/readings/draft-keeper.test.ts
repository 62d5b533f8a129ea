import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { DEFAULT_SHEET_UNITS } from '../../../../server/contract/readings';
import { ApiError } from '../../../../src/api/api-error';
import { DraftKeeper, type Draft } from '../../../../src/features/readings/draft-keeper';

const KEY = 'sheet';
const draft = (halfAB: string): Draft => ({
  rows: [{ cells: { halfAB }, excluded: null }],
  units: DEFAULT_SHEET_UNITS,
  baseRevisionId: null,
});

function setUp() {
  const kept = new Map<string, string>();
  const storage = {
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, text: string) => void kept.set(key, text),
    removeItem: (key: string) => void kept.delete(key),
  };
  const sent: Draft[] = [];
  const server = { isDown: false };
  const send = async (next: Draft): Promise<void> => {
    await new Promise((resolve) => setTimeout(resolve, 100));
    if (server.isDown) throw new ApiError('unreachable', 'The server cannot be reached.', { status: 0 });
    sent.push(next);
  };
  const keeper = new DraftKeeper({ key: KEY, storage, send });
  const close = keeper.open();
  return { keeper, kept, sent, server, close };
}

beforeEach(() => void vi.useFakeTimers());
afterEach(() => void vi.useRealTimers());

describe('keeping a draft', () => {
  it('stores each change on the device at once and sends the last after a rest', async () => {
    const { keeper, kept, sent } = setUp();
    keeper.change(draft('1'));
    keeper.change(draft('12'));
    expect(kept.get(KEY)).toContain('"12"');
    expect(keeper.getState().kind).toBe('waiting');
    await vi.advanceTimersByTimeAsync(1500);
    expect(sent).toEqual([draft('12')]);
    expect(keeper.getState().kind).toBe('kept');
    expect(kept.has(KEY)).toBe(false);
  });

  it('keeps the copy on the device while the server is away, and sends it when it is back', async () => {
    const { keeper, kept, sent, server } = setUp();
    server.isDown = true;
    keeper.change(draft('1'));
    await vi.advanceTimersByTimeAsync(2000);
    expect(keeper.getState()).toEqual({ kind: 'unsent', reason: 'The server cannot be reached.' });
    expect(keeper.readLocal()?.draft).toEqual(draft('1'));
    expect(kept.has(KEY)).toBe(true);
    server.isDown = false;
    await vi.advanceTimersByTimeAsync(11_000);
    expect(sent).toEqual([draft('1')]);
    expect(kept.has(KEY)).toBe(false);
  });

  it('does not call kept what was written while an earlier state was on its way', async () => {
    const { keeper, kept, sent } = setUp();
    keeper.change(draft('1'));
    await vi.advanceTimersByTimeAsync(1250);
    expect(keeper.getState().kind).toBe('sending');
    keeper.change(draft('12'));
    await vi.advanceTimersByTimeAsync(100);
    expect(keeper.getState().kind).toBe('waiting');
    expect(kept.get(KEY)).toContain('"12"');
    await vi.advanceTimersByTimeAsync(1500);
    expect(sent.at(-1)).toEqual(draft('12'));
  });

  it('sends at once what waits when the page is left, and does not go on after that', async () => {
    const { keeper, sent, server, close } = setUp();
    keeper.change(draft('1'));
    close();
    await vi.advanceTimersByTimeAsync(150);
    expect(sent).toHaveLength(1);
    server.isDown = true;
    keeper.change(draft('2'));
    await vi.advanceTimersByTimeAsync(60_000);
    expect(sent).toHaveLength(1);
  });
});

describe('saving', () => {
  it('lets nothing arrive after the save, and drops what was saved', async () => {
    const { keeper, kept, sent } = setUp();
    keeper.change(draft('1'));
    const settled = await keeper.settle();
    await vi.advanceTimersByTimeAsync(5000);
    expect(sent).toEqual([]);
    keeper.saved(settled, 'r1');
    expect(kept.has(KEY)).toBe(false);
    expect(keeper.getState().kind).toBe('none');
  });

  it('carries on what was written during the save, on top of the new revision', async () => {
    const { keeper, sent } = setUp();
    const revisionId = '0b0e5a52-7f0b-4a53-9f63-0f6a1c0f9d11';
    keeper.change(draft('1'));
    const settled = await keeper.settle();
    keeper.change(draft('12'));
    keeper.saved(settled, revisionId);
    await vi.advanceTimersByTimeAsync(2000);
    expect(sent.at(-1)).toEqual({ ...draft('12'), baseRevisionId: revisionId });
  });

  it('goes on keeping the draft when the save failed', async () => {
    const { keeper, sent } = setUp();
    keeper.change(draft('1'));
    await keeper.settle();
    keeper.resume();
    await vi.advanceTimersByTimeAsync(2000);
    expect(sent).toEqual([draft('1')]);
  });
});

describe('what lies on the device', () => {
  it('is not believed when it is not a draft', () => {
    const { keeper, kept } = setUp();
    expect(keeper.readLocal()).toBeNull();
    kept.set(KEY, '{"draft":{"rows":"none"}}');
    expect(keeper.readLocal()).toBeNull();
    kept.set(KEY, 'not JSON');
    expect(keeper.readLocal()).toBeNull();
  });
});
