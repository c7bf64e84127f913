import { existsSync, readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { projectRoot } from '#server/db/database.ts';
import { pipeline } from '#server/pipeline.ts';
import { blocks } from '#shared/document/registry.ts';

const at = (...parts: string[]): string => path.join(projectRoot, ...parts);
const scripts = Object.keys((JSON.parse(readFileSync(at('package.json'), 'utf8')) as { scripts: object }).scripts);

function filesBelow(folder: string): string[] {
  return readdirSync(at(folder), { withFileTypes: true }).flatMap((entry) => {
    const file = path.posix.join(folder, entry.name);
    return entry.isDirectory() ? filesBelow(file) : [file];
  });
}
const sourceFiles = ['shared', 'server', 'src', 'tests'].flatMap(filesBelow);

describe('the project', () => {
  it('explains every script to its contributors', () => {
    const guide = readFileSync(at('DEVELOPERS.md'), 'utf8');
    for (const script of scripts) expect([script, guide.includes(`\`${script}\``)]).toEqual([script, true]);
  });

  it('lists every setting in the README', () => {
    const readme = readFileSync(at('README.md'), 'utf8');
    const names = [...readFileSync(at('server/config/config.ts'), 'utf8').matchAll(/^ {2}([A-Z][A-Z0-9_]+):/gm)].map(
      (match) => match[1] ?? '',
    );
    expect(names.length).toBeGreaterThan(15);
    for (const name of names) expect([name, readme.includes(`\`${name}\``)]).toEqual([name, true]);
  });

  it('has a file for every kind of block but those that are one with another', () => {
    const together: Record<string, string> = { tableHeader: 'table-cell', hardBreak: 'text' };
    for (const kind of Object.keys(blocks)) {
      const name = together[kind] ?? kind.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`);
      expect([kind, existsSync(at('shared/document/blocks', `${name}.ts`))]).toEqual([kind, true]);
    }
  });

  it('names files in small letters with hyphens', () => {
    const odd = sourceFiles.filter((file) => !/^[a-z0-9.\-/]+$/.test(file) && !file.includes('tsconfig'));
    expect(odd).toEqual([]);
  });

  it('keeps every feature behind a door', () => {
    for (const feature of readdirSync(at('server/features')))
      expect([feature, existsSync(at('server/features', feature, 'index.ts'))]).toEqual([feature, true]);
  });

  it('has one resource under one name: what is described is called by the client', () => {
    const described = readdirSync(at('shared/api')).filter(
      (file) => !['endpoint.ts', 'common.ts', 'health.ts', 'events.ts'].includes(file),
    );
    const called = new Set(readdirSync(at('src/api')));
    for (const file of described) expect([file, called.has(file)]).toEqual([file, true]);
  });

  it('takes a page through its trip without a gap', () => {
    expect(Object.values(pipeline)).toEqual([
      'draw-page',
      'read-page',
      'structure-page',
      'index-page',
      'learn-page',
      'teach-manual',
    ]);
  });
});
