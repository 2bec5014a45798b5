import 'server-only';
import { text } from 'node:stream/consumers';
import { readLogHere, type LogToRead } from './read-log-here';

/** Reads a large log in a process of its own: what to read comes as JSON, what was read goes out as JSON. */
const task = JSON.parse(await text(process.stdin)) as LogToRead;
process.stdout.write(JSON.stringify(await readLogHere(task)));
