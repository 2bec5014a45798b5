import { contentProblems } from './structure/contents';
import { dependencyProblems } from './structure/dependencies';
import { placeProblems } from './structure/places';
import { readSources } from './structure/sources';

/** `npm run structure`: what the linter can’t see, because it looks at one file at a time. */
const root = process.cwd();
const problems = [...placeProblems(root), ...contentProblems(readSources(root)), ...dependencyProblems(root)];
for (const problem of problems) process.stderr.write(`${problem}\n`);
process.stdout.write(`${problems.length === 0 ? 'No' : problems.length} structure problems\n`);
if (problems.length > 0) process.exitCode = 1;
