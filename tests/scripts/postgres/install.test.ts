import { chmodSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { findPostgres } from '../../../scripts/postgres/binaries';
import { withoutMainCluster } from '../../../scripts/postgres/install';

describe('withoutMainCluster', () => {
  it('writes the setting into an absent or empty file', () => {
    expect(withoutMainCluster('')).toBe('create_main_cluster = false\n');
  });

  it('replaces the setting, commented out or not, and keeps all others', () => {
    const text = '# a comment\n#create_main_cluster = true\nssl = on\n';
    expect(withoutMainCluster(text)).toBe('# a comment\ncreate_main_cluster = false\nssl = on\n');
    expect(withoutMainCluster('create_main_cluster=yes\nssl = on\n')).toBe(
      'create_main_cluster = false\nssl = on\n',
    );
  });

  it('adds it to a file that ends without a line break', () => {
    expect(withoutMainCluster('ssl = on')).toBe('ssl = on\ncreate_main_cluster = false\n');
  });
});

describe('findPostgres', () => {
  const root = mkdtempSync(join(tmpdir(), 'layerwell-binaries-'));
  afterAll(() => rmSync(root, { recursive: true }));

  const makePrograms = (folder: string, names = ['postgres', 'initdb', 'pg_ctl']) => {
    mkdirSync(folder, { recursive: true });
    for (const name of names) {
      writeFileSync(join(folder, name), '');
      chmodSync(join(folder, name), 0o755);
    }
  };

  it('takes the newest complete version, passes old ones over and falls back to the PATH', () => {
    const onPath = join(root, 'opt');
    makePrograms(onPath);
    makePrograms(join(root, 'debian', '9', 'bin'));
    makePrograms(join(root, 'debian', '16', 'bin'), ['pg_ctl']);
    expect(findPostgres(join(root, 'debian'), onPath)).toBe(onPath);
    makePrograms(join(root, 'debian', '14', 'bin'));
    makePrograms(join(root, 'debian', '15', 'bin'));
    expect(findPostgres(join(root, 'debian'), onPath)).toBe(join(root, 'debian', '15', 'bin'));
    expect(findPostgres(join(root, 'absent'), '')).toBeNull();
  });
});
