import { beforeEach, expect, it } from 'vitest';
import { historyOf, useHandModelStore } from '../../../../src/features/bench/hand-model-store';

const run = { resistivity: [100, 10], thickness: [5] };
const first = { resistivity: [110, 10], thickness: [5] };
const second = { resistivity: [120, 10], thickness: [5] };
const store = () => useHandModelStore.getState();
const now = () => historyOf(store(), 'a').now;

beforeEach(() => useHandModelStore.setState({ soundings: {} }));

it('undoes and redoes edits one by one, back to the run', () => {
  store().edit('a', run, first);
  store().edit('a', first, second);
  store().undo('a');
  expect(now().earth).toEqual(first);
  store().undo('a');
  expect(now().earth).toBeNull();
  store().undo('a');
  expect(now().earth).toBeNull();
  store().redo('a');
  store().redo('a');
  expect(now().earth).toEqual(second);
});

it('undoes a whole gesture at once', () => {
  store().edit('a', run, first, 'drag 1');
  store().edit('a', first, second, 'drag 1');
  store().undo('a');
  expect(now().earth).toBeNull();
});

it('drops what was undone when something new is done', () => {
  store().edit('a', run, first);
  store().undo('a');
  store().edit('a', run, second);
  store().redo('a');
  expect(now().earth).toEqual(second);
});

it('takes no step for an edit that changes nothing', () => {
  store().edit('a', run, { ...run });
  expect(historyOf(store(), 'a').past).toEqual([]);
});

it('lets held values go when the count of beds changes, and brings them back by undo', () => {
  store().hold('a', ['thickness 0']);
  store().edit('a', run, first);
  expect(now().held).toEqual(['thickness 0']);
  store().edit('a', first, { resistivity: [110, 10, 10], thickness: [5, 5] });
  expect(now().held).toEqual([]);
  store().undo('a');
  expect(now().held).toEqual(['thickness 0']);
});

it('goes back to the run as an edit that can be undone', () => {
  store().edit('a', run, first);
  store().hold('a', ['resistivity 1']);
  store().takeUpRun('a');
  expect(now()).toEqual({ earth: null, held: null });
  store().takeUpRun('a');
  store().undo('a');
  expect(now()).toEqual({ earth: first, held: ['resistivity 1'] });
});

it('keeps soundings apart', () => {
  store().edit('a', run, first);
  expect(historyOf(store(), 'b').now.earth).toBeNull();
});

it('names a model taken from elsewhere until it is changed', () => {
  store().lookAt('a', first, '2 beds, from the ladder');
  expect(now()).toEqual({ earth: first, held: [], name: '2 beds, from the ladder' });
  store().hold('a', ['resistivity 0']);
  expect(now().name).toBe('2 beds, from the ladder');
  store().edit('a', first, second);
  expect(now().name).toBeUndefined();
  store().undo('a');
  expect(now().name).toBe('2 beds, from the ladder');
});
