import { readFileSync } from 'node:fs';
import path from 'node:path';

interface Floors {
  packages: Record<string, string>;
  refusedPackages: Record<string, string>;
}

interface LockedPackage {
  version?: string;
  resolved?: string;
  link?: boolean;
}

/** Parts that are older than a fix we rely on, or that must not come in; and traces of where they were fetched. */
export function dependencyProblems(root: string): string[] {
  const read = (file: string): unknown => JSON.parse(readFileSync(path.join(root, file), 'utf8'));
  const { packages, refusedPackages } = read('lib/ops/version-floors.json') as Floors;
  const lock = read('package-lock.json') as { packages: Record<string, LockedPackage> };
  return Object.entries(lock.packages).flatMap(([place, locked]) => {
    const name = place.slice(place.lastIndexOf('node_modules/') + 'node_modules/'.length);
    const floor = packages[name];
    const refused = place.includes('node_modules/') ? refusedPackages[name] : undefined;
    const problems: string[] = [];
    if (refused) problems.push(`${name} must not be installed. ${refused}`);
    if (floor && locked.version && isOlder(locked.version, floor)) {
      problems.push(
        `${name} ${locked.version} is older than ${floor}, which closed a hole: npm install ${name}@latest`,
      );
    }
    if (locked.resolved && !locked.link && !locked.resolved.startsWith('file:')) {
      problems.push(`package-lock.json names where ${name} was fetched; .npmrc says that it must not.`);
    }
    if (name === 'sharp' && place !== 'node_modules/sharp')
      problems.push(`${place}: pictures are jimp’s; see overrides.`);
    return problems;
  });
}

function isOlder(version: string, floor: string): boolean {
  const numbers = (text: string) => text.split(/[.-]/).slice(0, 3).map(Number);
  const [ours, least] = [numbers(version), numbers(floor)];
  const i = ours.findIndex((part, index) => part !== least[index]);
  return i >= 0 && (ours[i] ?? 0) < (least[i] ?? 0);
}
