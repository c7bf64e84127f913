import { type Result, fail, succeed } from '#shared/kit/result.ts';
import type { DocNode } from './define-block.ts';

type Upgrade = (old: DocNode) => DocNode;

/** upgrades[n] turns a document of version n + 1 into version n + 2. Append; never edit one that has shipped. */
export const upgrades: readonly Upgrade[] = [];
export const currentVersion = upgrades.length + 1;

/** Brings a stored document up to the current version. One written by a newer program is refused, not guessed at. */
export function upgradeDocument(document: DocNode, steps: readonly Upgrade[] = upgrades): Result<DocNode, string> {
  const version = Number(document.attrs?.['version'] ?? 1);
  if (!Number.isInteger(version) || version < 1) return fail('The version of a document is a whole number from 1.');
  if (version > steps.length + 1) {
    return fail(`This document is of version ${version}; this program reads up to version ${steps.length + 1}.`);
  }
  const upgraded = steps.slice(version - 1).reduce((old, upgrade) => upgrade(old), document);
  return succeed({ ...upgraded, attrs: { ...upgraded.attrs, version: steps.length + 1 } });
}
