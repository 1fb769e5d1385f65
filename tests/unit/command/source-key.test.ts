import { mkdirSync, mkdtempSync, rmSync, utimesSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { sourceKey } from '@/lib/command/source-key';

let root: string;

beforeEach(() => {
  root = mkdtempSync(path.join(tmpdir(), 'evenohm-sources-'));
  write('app/page.tsx', 'one');
  write('lib/database/generated/client.ts', 'generated');
});

afterEach(() => rmSync(root, { recursive: true }));

describe('sourceKey', () => {
  it('stays the same when only the time of a file changes, or what is generated', () => {
    const before = sourceKey(root);
    utimesSync(path.join(root, 'app/page.tsx'), 1, 1);
    write('lib/database/generated/client.ts', 'generated anew');
    expect(sourceKey(root)).toBe(before);
  });
  it('changes with the content of a file, its name, and a new file', () => {
    const keys = [sourceKey(root)];
    write('app/page.tsx', 'two');
    keys.push(sourceKey(root));
    write('app/loading.tsx', '');
    keys.push(sourceKey(root));
    rmSync(path.join(root, 'app/loading.tsx'));
    write('app/error.tsx', '');
    keys.push(sourceKey(root));
    expect(new Set(keys).size).toBe(4);
  });
});

function write(file: string, content: string): void {
  mkdirSync(path.dirname(path.join(root, file)), { recursive: true });
  writeFileSync(path.join(root, file), content);
}
