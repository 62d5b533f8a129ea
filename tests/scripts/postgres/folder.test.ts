import { chmodSync, mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { findAccount } from '../../../scripts/postgres/account';
import { checkoutKey, chooseFolder, socketFolder } from '../../../scripts/postgres/folder';

let root: string;
let said: string[];

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'layerwell-folder-'));
  chmodSync(root, 0o755);
  said = [];
});
afterEach(() => rmSync(root, { recursive: true }));

function makeCheckout(homeMode: number): string {
  const checkout = join(root, 'home', 'checkout');
  mkdirSync(checkout, { recursive: true });
  chmodSync(join(root, 'home'), homeMode);
  return checkout;
}

const choose = async (checkout: string) =>
  chooseFolder(checkout, await findAccount(), (line) => said.push(line), join(root, 'shared'));

describe('chooseFolder', () => {
  it('stays inside a checkout that can be reached', async () => {
    const checkout = makeCheckout(0o755);
    expect(await choose(checkout)).toBe(join(checkout, '.layerwell', 'postgres'));
    expect(said).toEqual([]);
  });

  it.runIf(process.getuid?.() === 0)(
    'goes outside one under a closed home, says so, and stays there',
    async () => {
      const checkout = makeCheckout(0o700);
      const outside = join(root, 'shared', checkoutKey(checkout));
      expect(await choose(checkout)).toBe(outside);
      expect(said).toEqual([expect.stringContaining(`the database lives in ${outside}`)]);
      mkdirSync(join(outside, 'data'), { recursive: true });
      chmodSync(join(root, 'home'), 0o755);
      expect(await choose(checkout)).toBe(outside);
    },
  );
});

describe('socketFolder', () => {
  it('is left out where the address would not fit into 107 bytes', () => {
    expect(socketFolder('/srv/checkout')).toBe('/srv/checkout/sock');
    expect(socketFolder(`/${'a'.repeat(90)}`)).toBeNull();
    expect(socketFolder(`/${'é'.repeat(45)}`)).toBeNull();
  });
});
