'use client';

import { useRef, useState } from 'react';
import { Button } from '@/components/ui/button';
import { FileDrop } from '@/components/ui/file-drop';
import { Select } from '@/components/ui/inputs';
import { Progress } from '@/components/ui/progress';
import { ApiProblem } from '@/lib/platform/http/call-api';
import { traceReading, type TraceReadingAnswer } from '@/lib/reports/schema/trace';
import { sendFile } from './send-file';

const MOST_BYTES = 64_000_000;

/** The browser's own zone first, then a few others; logs of a laptop carried elsewhere are rare. */
function zones(): string[] {
  const own = Intl.DateTimeFormat().resolvedOptions().timeZone;
  return [...new Set([own, 'UTC', ...Intl.supportedValuesOf('timeZone')])];
}

interface TraceUploadProps {
  error?: string;
  onReading: (reading: TraceReadingAnswer, fileName: string, zone: string) => void;
}

/** Chooses, sends and has a logger's file read; what goes wrong is said beside the file, which can be sent again. */
export function TraceUpload({ error, onReading }: TraceUploadProps) {
  const [zone, setZone] = useState(() => zones()[0] ?? 'UTC');
  const [sending, setSending] = useState<{ name: string; share: number } | null>(null);
  const [failed, setFailed] = useState<{ file: File; message: string } | null>(null);
  const abort = useRef<AbortController | null>(null);

  const send = async (file: File) => {
    setFailed(null);
    if (file.size > MOST_BYTES) {
      return setFailed({ file, message: `${file.name} is larger than 64 MB. Cut it to the days you need.` });
    }
    abort.current = new AbortController();
    setSending({ name: file.name, share: 0 });
    try {
      const reading = await sendFile({
        path: '/api/v1/traces',
        file,
        name: file.name,
        fields: { zone },
        answer: traceReading,
        onProgress: (share) => setSending({ name: file.name, share }),
        signal: abort.current.signal,
      });
      onReading(reading, file.name, zone);
    } catch (problem) {
      const cancelled = problem instanceof ApiProblem && problem.code === 'cancelled';
      if (!cancelled) {
        setFailed({ file, message: problem instanceof Error ? `${file.name}: ${problem.message}` : 'Send it again.' });
      }
    } finally {
      setSending(null);
    }
  };

  return (
    <>
      <Select
        label="Clock of the logger"
        name="zone"
        hint="Needed where the file writes local times."
        className="max-w-md"
        value={zone}
        onChange={(event) => setZone(event.target.value)}
        options={zones().map((name) => ({ value: name, label: name }))}
      />
      <FileDrop
        name="traces"
        label="A logger’s file"
        hint="CSV or text, at most 64 MB. It stays private to this report; the readings are published."
        accept=".csv,.txt,.tsv,.log,text/csv,text/plain"
        error={failed?.message ?? error}
        onFiles={([file]) => file && void send(file)}
      >
        {sending && (
          <>
            <Progress
              label={`Sending ${sending.name}`}
              value={sending.share < 1 ? sending.share : undefined}
              status={sending.share < 1 ? `${Math.round(sending.share * 100)} %` : 'reading it'}
            />
            <Button look="quiet" onClick={() => abort.current?.abort()}>
              Cancel sending
            </Button>
          </>
        )}
        {failed && failed.file.size <= MOST_BYTES && (
          <Button look="quiet" onClick={() => void send(failed.file)}>
            Send {failed.file.name} again
          </Button>
        )}
      </FileDrop>
    </>
  );
}
