import { z } from 'zod';
import { ApiProblem, callApi } from '@/lib/platform/http/call-api';
import type { EditorValues } from './editor-values';

export type SaveState =
  | { kind: 'untouched' }
  | { kind: 'saving' }
  | { kind: 'saved' }
  /** No connection, or signed out: what was typed is in this browser. */
  | { kind: 'here-only'; reason: string }
  /** Changed elsewhere meanwhile: both texts are there. */
  | { kind: 'conflict'; version: number; theirs: EditorValues };

const saved = z.object({ publicId: z.string(), version: z.int() });
const LOCAL_KEY = 'wattcairn-draft';
const PAUSE_MS = 1000;
const RETRY_MS = 5000;

/** What this browser kept of a draft that never reached the server, and over which version it was typed. */
export interface KeptDraft {
  version: number;
  values: EditorValues;
}

export function keptHere(draftPublicId: string | null): KeptDraft | null {
  try {
    const text = localStorage.getItem(`${LOCAL_KEY}-${draftPublicId ?? 'new'}`);
    return text ? (JSON.parse(text) as KeptDraft) : null;
  } catch {
    return null;
  }
}

/**
 * Saves a draft as one types: in this browser at once, on the server after a short pause, one request at a time. Of two
 * browsers on one draft the later one is told, and nothing is overwritten unseen.
 */
export class DraftSaver {
  private latest: EditorValues | null = null;
  private timer: ReturnType<typeof setTimeout> | null = null;
  private busy = false;

  constructor(
    private draft: { publicId: string | null; version: number },
    private readonly tell: (state: SaveState) => void,
  ) {}

  get publicId(): string | null {
    return this.draft.publicId;
  }

  save(values: EditorValues): void {
    this.latest = values;
    try {
      const kept: KeptDraft = { version: this.draft.version, values };
      localStorage.setItem(this.key(), JSON.stringify(kept));
    } catch {
      // A full or closed store of this browser: the server's copy has to do.
    }
    this.pushIn(PAUSE_MS);
  }

  /** Sends what is newest; while a request is under way the next one follows it. */
  async push(): Promise<void> {
    if (this.busy) return;
    this.busy = true;
    let sent: EditorValues | null = null;
    try {
      while (this.latest !== null && this.latest !== sent) {
        sent = this.latest;
        this.tell({ kind: 'saving' });
        await this.send(sent);
      }
      if (sent !== null) this.tell({ kind: 'saved' });
    } catch (error) {
      this.tell(stateAfter(error));
      if (error instanceof ApiProblem && (error.status === 0 || error.status >= 500)) this.pushIn(RETRY_MS);
    } finally {
      this.busy = false;
    }
  }

  /** Goes on from what was saved elsewhere, with one's own text or with the other. */
  settle(version: number, values: EditorValues): void {
    this.draft = { ...this.draft, version };
    this.latest = values;
    void this.push();
  }

  /** The report was sent: nothing is left to keep. */
  forget(): void {
    if (this.timer) clearTimeout(this.timer);
    this.latest = null;
    for (const name of ['new', this.draft.publicId]) localStorage.removeItem(`${LOCAL_KEY}-${name}`);
  }

  private async send(values: EditorValues): Promise<void> {
    const { publicId, version } = this.draft;
    const content = { body: { content: values }, answer: saved };
    const answer =
      publicId === null
        ? await callApi('/api/v1/drafts', { method: 'POST', ...content, idempotencyKey: values.clientKey })
        : await callApi(`/api/v1/drafts/${publicId}`, { method: 'PUT', ...content, ifMatch: version });
    localStorage.removeItem(this.key());
    if (publicId === null) window.history.replaceState(null, '', `/reports/new?draft=${answer.publicId}`);
    this.draft = answer;
  }

  private pushIn(milliseconds: number): void {
    if (this.timer) clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.push(), milliseconds);
  }

  private key(): string {
    return `${LOCAL_KEY}-${this.draft.publicId ?? 'new'}`;
  }
}

function stateAfter(error: unknown): SaveState {
  if (error instanceof ApiProblem) {
    if (error.code === 'version-changed') {
      return { kind: 'conflict', version: Number(error.facts.version), theirs: error.facts.content as EditorValues };
    }
    if (error.status === 401) return { kind: 'here-only', reason: 'You are signed out. Sign in again in another tab.' };
    return { kind: 'here-only', reason: error.message };
  }
  return { kind: 'here-only', reason: 'The site does not answer as expected.' };
}
