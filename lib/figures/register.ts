import 'server-only';
import { beforeCommit } from '@/lib/platform/database/transaction';
import { recomputeTouched } from './commands/recompute';

// Whoever runs commands imports this file: the published figures then move in the command's own transaction.
beforeCommit('figures', recomputeTouched);
